import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** An instrument on the register. */
export class Logger extends Model<InferAttributes<Logger>, InferCreationAttributes<Logger>> {
	declare id: string;
	declare serial: string;
	declare kind: 'reusable' | 'one-trip';
	declare ownerId: string | null;
	declare accuracyCelsius: number;
	declare startDelayMinutes: number;
	declare calibrationDueOn: string | null;
	declare note: string;
	declare createdAt: Date;
	declare switchedOffAt: Date | null;
}

export function defineLogger(sequelize: Sequelize): void {
	Logger.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			serial: { type: DataTypes.STRING(60), allowNull: false },
			kind: { type: DataTypes.ENUM('reusable', 'one-trip'), allowNull: false },
			ownerId: { type: DataTypes.UUID, allowNull: true },
			accuracyCelsius: { type: DataTypes.DOUBLE, allowNull: false },
			startDelayMinutes: { type: DataTypes.INTEGER, allowNull: false },
			calibrationDueOn: { type: DataTypes.DATEONLY, allowNull: true },
			note: { type: DataTypes.STRING(300), allowNull: false },
			createdAt: { type: DataTypes.DATE(3), allowNull: false },
			switchedOffAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'Logger', tableName: 'loggers' }
	);
}
