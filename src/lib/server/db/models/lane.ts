import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A route with its findings grades and whether a logger must ride. */
export class Lane extends Model<InferAttributes<Lane>, InferCreationAttributes<Lane>> {
	declare id: string;
	declare name: string;
	declare supplierId: string | null;
	declare siteId: string;
	declare isLoggerRequired: boolean;
	declare findingGrades: unknown;
	declare createdAt: Date;
	declare switchedOffAt: Date | null;
}

export function defineLane(sequelize: Sequelize): void {
	Lane.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			name: { type: DataTypes.STRING(120), allowNull: false },
			supplierId: { type: DataTypes.UUID, allowNull: true },
			siteId: { type: DataTypes.UUID, allowNull: false },
			isLoggerRequired: { type: DataTypes.BOOLEAN, allowNull: false },
			findingGrades: { type: DataTypes.JSON, allowNull: false },
			createdAt: { type: DataTypes.DATE(3), allowNull: false },
			switchedOffAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'Lane', tableName: 'lanes' }
	);
}
