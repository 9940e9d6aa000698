import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** Money asked back from whoever had custody. */
export class Claim extends Model<InferAttributes<Claim>, InferCreationAttributes<Claim>> {
	declare id: string;
	declare number: string;
	declare shipmentId: string;
	declare dispositionId: string | null;
	declare againstId: string | null;
	declare status: 'open' | 'noticed' | 'filed' | 'settled' | 'declined' | 'closed';
	declare amountMinor: number | null;
	declare currency: string;
	declare basis: CreationOptional<string>;
	declare openedBy: string;
	declare openedAt: Date;
	declare closedAt: Date | null;
	declare version: CreationOptional<number>;
}

export function defineClaim(sequelize: Sequelize): void {
	Claim.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			number: { type: DataTypes.STRING(24), allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			dispositionId: { type: DataTypes.UUID, allowNull: true },
			againstId: { type: DataTypes.UUID, allowNull: true },
			status: {
				type: DataTypes.ENUM('open', 'noticed', 'filed', 'settled', 'declined', 'closed'),
				allowNull: false
			},
			amountMinor: { type: DataTypes.BIGINT, allowNull: true },
			currency: { type: DataTypes.CHAR(3), allowNull: false },
			basis: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
			openedBy: { type: DataTypes.UUID, allowNull: false },
			openedAt: { type: DataTypes.DATE(3), allowNull: false },
			closedAt: { type: DataTypes.DATE(3), allowNull: true },
			version: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 }
		},
		{ sequelize, modelName: 'Claim', tableName: 'claims' }
	);
}
