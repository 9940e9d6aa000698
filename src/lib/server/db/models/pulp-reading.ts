import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A probe reading at the door, kept as written. */
export class PulpReading extends Model<InferAttributes<PulpReading>, InferCreationAttributes<PulpReading>> {
	declare id: string;
	declare shipmentId: string;
	declare lineId: string | null;
	declare position: string;
	declare caseLabel: string | null;
	declare degrees: number;
	declare unit: 'celsius' | 'fahrenheit';
	declare instrument: string | null;
	declare takenAt: Date;
	declare takenBy: string;
}

export function definePulpReading(sequelize: Sequelize): void {
	PulpReading.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			lineId: { type: DataTypes.UUID, allowNull: true },
			position: { type: DataTypes.STRING(80), allowNull: false },
			caseLabel: { type: DataTypes.STRING(80), allowNull: true },
			degrees: { type: DataTypes.DOUBLE, allowNull: false },
			unit: { type: DataTypes.ENUM('celsius', 'fahrenheit'), allowNull: false },
			instrument: { type: DataTypes.STRING(80), allowNull: true },
			takenAt: { type: DataTypes.DATE(3), allowNull: false },
			takenBy: { type: DataTypes.UUID, allowNull: false }
		},
		{ sequelize, modelName: 'PulpReading', tableName: 'pulp_readings' }
	);
}
