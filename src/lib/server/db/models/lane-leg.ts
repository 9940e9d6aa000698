import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A planned leg of a lane with its allowance. */
export class LaneLeg extends Model<InferAttributes<LaneLeg>, InferCreationAttributes<LaneLeg>> {
	declare id: string;
	declare laneId: string;
	declare ordinal: number;
	declare holderId: string | null;
	declare place: string;
	declare plannedMinutes: number;
	declare setPointCelsius: number | null;
	declare allowedHours: number | null;
}

export function defineLaneLeg(sequelize: Sequelize): void {
	LaneLeg.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			laneId: { type: DataTypes.UUID, allowNull: false },
			ordinal: { type: DataTypes.INTEGER, allowNull: false },
			holderId: { type: DataTypes.UUID, allowNull: true },
			place: { type: DataTypes.STRING(120), allowNull: false },
			plannedMinutes: { type: DataTypes.INTEGER, allowNull: false },
			setPointCelsius: { type: DataTypes.DOUBLE, allowNull: true },
			allowedHours: { type: DataTypes.DOUBLE, allowNull: true }
		},
		{ sequelize, modelName: 'LaneLeg', tableName: 'lane_legs' }
	);
}
