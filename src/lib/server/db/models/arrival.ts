import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** What was seen at the door. */
export class Arrival extends Model<InferAttributes<Arrival>, InferCreationAttributes<Arrival>> {
	declare id: string;
	declare shipmentId: string;
	declare arrivedAt: Date;
	declare sealFound: string | null;
	declare isSealIntact: boolean | null;
	declare setPointCelsius: number | null;
	declare returnAirCelsius: number | null;
	declare conditionNote: CreationOptional<string>;
	declare driverName: string | null;
	declare driverSignatureId: string | null;
	declare reservation: CreationOptional<string>;
	declare loggedBy: string;
	declare loggedAt: Date;
}

export function defineArrival(sequelize: Sequelize): void {
	Arrival.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			arrivedAt: { type: DataTypes.DATE(3), allowNull: false },
			sealFound: { type: DataTypes.STRING(60), allowNull: true },
			isSealIntact: { type: DataTypes.BOOLEAN, allowNull: true },
			setPointCelsius: { type: DataTypes.DOUBLE, allowNull: true },
			returnAirCelsius: { type: DataTypes.DOUBLE, allowNull: true },
			conditionNote: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
			driverName: { type: DataTypes.STRING(120), allowNull: true },
			driverSignatureId: { type: DataTypes.UUID, allowNull: true },
			reservation: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
			loggedBy: { type: DataTypes.UUID, allowNull: false },
			loggedAt: { type: DataTypes.DATE(3), allowNull: false }
		},
		{ sequelize, modelName: 'Arrival', tableName: 'arrivals' }
	);
}
