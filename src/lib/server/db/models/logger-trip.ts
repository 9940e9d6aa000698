import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A logger expected or found on a load, and what became of it. */
export class LoggerTrip extends Model<InferAttributes<LoggerTrip>, InferCreationAttributes<LoggerTrip>> {
	declare id: string;
	declare shipmentId: string;
	declare loggerId: string | null;
	declare serial: string;
	declare ordinal: number;
	declare lineId: string | null;
	declare palletId: string | null;
	/** Null: the shipment's own. */
	declare compartmentId: string | null;
	declare position: string | null;
	declare placement: 'air' | 'between-cases' | 'in-product';
	declare status: 'expected' | 'found' | 'not-found' | 'dead' | 'not-started' | 'other-load';
}

export function defineLoggerTrip(sequelize: Sequelize): void {
	LoggerTrip.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			loggerId: { type: DataTypes.UUID, allowNull: true },
			serial: { type: DataTypes.STRING(60), allowNull: false },
			ordinal: { type: DataTypes.INTEGER, allowNull: false },
			lineId: { type: DataTypes.UUID, allowNull: true },
			palletId: { type: DataTypes.UUID, allowNull: true },
			compartmentId: { type: DataTypes.UUID, allowNull: true },
			position: { type: DataTypes.STRING(120), allowNull: true },
			placement: { type: DataTypes.ENUM('air', 'between-cases', 'in-product'), allowNull: false },
			status: {
				type: DataTypes.ENUM('expected', 'found', 'not-found', 'dead', 'not-started', 'other-load'),
				allowNull: false
			}
		},
		{ sequelize, modelName: 'LoggerTrip', tableName: 'logger_trips' }
	);
}
