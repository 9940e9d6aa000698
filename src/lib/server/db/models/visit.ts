import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** One truck at the door. */
export class Visit extends Model<InferAttributes<Visit>, InferCreationAttributes<Visit>> {
	declare id: string;
	declare siteId: string;
	declare carrierId: string | null;
	declare trailer: string;
	declare driverName: string;
	declare dock: string;
	declare stopsMade: number | null;
	declare stopsToCome: number | null;
	declare sealOff: string | null;
	declare sealOn: string | null;
	declare arrivedAt: Date;
	declare departedAt: Date | null;
}

export function defineVisit(sequelize: Sequelize): void {
	Visit.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			siteId: { type: DataTypes.UUID, allowNull: false },
			carrierId: { type: DataTypes.UUID, allowNull: true },
			trailer: { type: DataTypes.STRING(40), allowNull: false },
			driverName: { type: DataTypes.STRING(120), allowNull: false },
			dock: { type: DataTypes.STRING(40), allowNull: false },
			stopsMade: { type: DataTypes.INTEGER, allowNull: true },
			stopsToCome: { type: DataTypes.INTEGER, allowNull: true },
			sealOff: { type: DataTypes.STRING(40), allowNull: true },
			sealOn: { type: DataTypes.STRING(40), allowNull: true },
			arrivedAt: { type: DataTypes.DATE(3), allowNull: false },
			departedAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'Visit', tableName: 'visits' }
	);
}
