import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A row of a claim's valuation. */
export class ClaimItem extends Model<InferAttributes<ClaimItem>, InferCreationAttributes<ClaimItem>> {
	declare id: string;
	declare claimId: string;
	declare ordinal: number;
	declare text: string;
	declare quantity: number;
	declare quantityUnit: string;
	declare eachMinor: number;
	declare amountMinor: number;
}

export function defineClaimItem(sequelize: Sequelize): void {
	ClaimItem.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			claimId: { type: DataTypes.UUID, allowNull: false },
			ordinal: { type: DataTypes.INTEGER, allowNull: false },
			text: { type: DataTypes.STRING(200), allowNull: false },
			quantity: { type: DataTypes.DOUBLE, allowNull: false },
			quantityUnit: { type: DataTypes.STRING(30), allowNull: false },
			eachMinor: { type: DataTypes.BIGINT, allowNull: false },
			amountMinor: { type: DataTypes.BIGINT, allowNull: false }
		},
		{ sequelize, modelName: 'ClaimItem', tableName: 'claim_items' }
	);
}
