import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A stretch outside a limit found by an assessment. */
export class ExcursionRow extends Model<
	InferAttributes<ExcursionRow>,
	InferCreationAttributes<ExcursionRow>
> {
	declare id: string;
	declare assessmentId: string;
	declare ordinal: number;
	declare kind: 'too-warm' | 'too-cold';
	declare severity: 'minor' | 'major' | 'critical';
	declare fromAt: Date;
	declare toAt: Date;
	declare extremeCelsius: number;
	declare costHours: number;
}

export function defineExcursionRow(sequelize: Sequelize): void {
	ExcursionRow.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			assessmentId: { type: DataTypes.UUID, allowNull: false },
			ordinal: { type: DataTypes.INTEGER, allowNull: false },
			kind: { type: DataTypes.ENUM('too-warm', 'too-cold'), allowNull: false },
			severity: { type: DataTypes.ENUM('minor', 'major', 'critical'), allowNull: false },
			fromAt: { type: DataTypes.DATE(3), allowNull: false },
			toAt: { type: DataTypes.DATE(3), allowNull: false },
			extremeCelsius: { type: DataTypes.DOUBLE, allowNull: false },
			costHours: { type: DataTypes.DOUBLE, allowNull: false }
		},
		{ sequelize, modelName: 'ExcursionRow', tableName: 'excursions' }
	);
}
