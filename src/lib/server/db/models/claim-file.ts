import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** Evidence attached to a claim. */
export class ClaimFile extends Model<InferAttributes<ClaimFile>, InferCreationAttributes<ClaimFile>> {
	declare id: string;
	declare claimId: string;
	declare fileId: string;
	declare what: string;
	declare fileName: string;
	declare attachedBy: string;
	declare attachedAt: Date;
}

export function defineClaimFile(sequelize: Sequelize): void {
	ClaimFile.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			claimId: { type: DataTypes.UUID, allowNull: false },
			fileId: { type: DataTypes.UUID, allowNull: false },
			what: { type: DataTypes.STRING(200), allowNull: false },
			fileName: { type: DataTypes.STRING(200), allowNull: false },
			attachedBy: { type: DataTypes.UUID, allowNull: false },
			attachedAt: { type: DataTypes.DATE(3), allowNull: false }
		},
		{ sequelize, modelName: 'ClaimFile', tableName: 'claim_files' }
	);
}
