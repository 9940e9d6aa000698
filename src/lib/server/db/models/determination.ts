import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** What a qualified person has determined, in writing and signed, of goods over an absolute stop. */
export class Determination extends Model<
	InferAttributes<Determination>,
	InferCreationAttributes<Determination>
> {
	declare id: string;
	declare shipmentId: string;
	declare evidenceSha256: string;
	declare text: string;
	declare signedBy: string;
	declare signedName: string;
	declare signedTitle: string;
	declare signedAt: Date;
	declare zone: string;
}

export function defineDetermination(sequelize: Sequelize): void {
	Determination.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			evidenceSha256: { type: DataTypes.CHAR(64), allowNull: false, field: 'evidence_sha256' },
			text: { type: DataTypes.TEXT, allowNull: false },
			signedBy: { type: DataTypes.UUID, allowNull: false },
			signedName: { type: DataTypes.STRING(120), allowNull: false },
			signedTitle: { type: DataTypes.STRING(120), allowNull: false },
			signedAt: { type: DataTypes.DATE(3), allowNull: false },
			zone: { type: DataTypes.STRING(64), allowNull: false }
		},
		{ sequelize, modelName: 'Determination', tableName: 'determinations' }
	);
}
