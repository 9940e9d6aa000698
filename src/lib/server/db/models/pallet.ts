import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A logistic unit of a line. */
export class Pallet extends Model<InferAttributes<Pallet>, InferCreationAttributes<Pallet>> {
	declare id: string;
	declare lineId: string;
	declare ordinal: number;
	declare sscc: string | null;
	declare cases: number;
	declare whereabouts: string | null;
}

export function definePallet(sequelize: Sequelize): void {
	Pallet.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			lineId: { type: DataTypes.UUID, allowNull: false },
			ordinal: { type: DataTypes.INTEGER, allowNull: false },
			sscc: { type: DataTypes.CHAR(18), allowNull: true },
			cases: { type: DataTypes.INTEGER, allowNull: false },
			whereabouts: { type: DataTypes.STRING(80), allowNull: true }
		},
		{ sequelize, modelName: 'Pallet', tableName: 'pallets' }
	);
}
