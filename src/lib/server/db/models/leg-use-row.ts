import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** Life used against life allowed on one leg. */
export class LegUseRow extends Model<InferAttributes<LegUseRow>, InferCreationAttributes<LegUseRow>> {
	declare id: string;
	declare assessmentId: string;
	declare handoverId: string;
	declare ordinal: number;
	declare allowedHours: number | null;
	declare usedHours: number;
	declare tooWarmHours: number | null;
	declare tooLateHours: number | null;
}

export function defineLegUseRow(sequelize: Sequelize): void {
	LegUseRow.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			assessmentId: { type: DataTypes.UUID, allowNull: false },
			handoverId: { type: DataTypes.UUID, allowNull: false },
			ordinal: { type: DataTypes.INTEGER, allowNull: false },
			allowedHours: { type: DataTypes.DOUBLE, allowNull: true },
			usedHours: { type: DataTypes.DOUBLE, allowNull: false },
			tooWarmHours: { type: DataTypes.DOUBLE, allowNull: true },
			tooLateHours: { type: DataTypes.DOUBLE, allowNull: true }
		},
		{ sequelize, modelName: 'LegUseRow', tableName: 'leg_uses' }
	);
}
