import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** An ordered instant at which custody passes to a holder. */
export class Handover extends Model<InferAttributes<Handover>, InferCreationAttributes<Handover>> {
	declare id: string;
	declare shipmentId: string;
	declare ordinal: number;
	declare partnerId: string | null;
	declare holder: string;
	declare place: string;
	declare plannedAt: Date | null;
	declare actualAt: Date | null;
	declare plusMinusMinutes: number;
	declare source: string | null;
	declare setPointCelsius: number | null;
	declare allowedHours: number | null;
}

export function defineHandover(sequelize: Sequelize): void {
	Handover.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			ordinal: { type: DataTypes.INTEGER, allowNull: false },
			partnerId: { type: DataTypes.UUID, allowNull: true },
			holder: { type: DataTypes.STRING(120), allowNull: false },
			place: { type: DataTypes.STRING(160), allowNull: false },
			plannedAt: { type: DataTypes.DATE(3), allowNull: true },
			actualAt: { type: DataTypes.DATE(3), allowNull: true },
			plusMinusMinutes: { type: DataTypes.INTEGER, allowNull: false },
			source: { type: DataTypes.STRING(120), allowNull: true },
			setPointCelsius: { type: DataTypes.DOUBLE, allowNull: true },
			allowedHours: { type: DataTypes.DOUBLE, allowNull: true }
		},
		{ sequelize, modelName: 'Handover', tableName: 'handovers' }
	);
}
