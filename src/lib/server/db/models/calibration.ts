import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A check of an instrument against a reference. */
export class Calibration extends Model<InferAttributes<Calibration>, InferCreationAttributes<Calibration>> {
	declare id: string;
	declare loggerId: string;
	declare calibratedOn: string;
	declare dueOn: string;
	declare certificateNumber: string;
	declare laboratory: string;
	declare errorCelsius: number | null;
	declare fileId: string | null;
}

export function defineCalibration(sequelize: Sequelize): void {
	Calibration.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			loggerId: { type: DataTypes.UUID, allowNull: false },
			calibratedOn: { type: DataTypes.DATEONLY, allowNull: false },
			dueOn: { type: DataTypes.DATEONLY, allowNull: false },
			certificateNumber: { type: DataTypes.STRING(60), allowNull: false },
			laboratory: { type: DataTypes.STRING(120), allowNull: false },
			errorCelsius: { type: DataTypes.DOUBLE, allowNull: true },
			fileId: { type: DataTypes.UUID, allowNull: true }
		},
		{ sequelize, modelName: 'Calibration', tableName: 'calibrations' }
	);
}
