import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** The sealed receiving report of a signed decision. */
export class Report extends Model<InferAttributes<Report>, InferCreationAttributes<Report>> {
	declare id: string;
	declare dispositionId: string;
	declare shipmentId: string;
	declare fileId: string;
	declare fileName: string;
	declare certificateId: string;
	declare madeAt: Date;
}

export function defineReport(sequelize: Sequelize): void {
	Report.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			dispositionId: { type: DataTypes.UUID, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			fileId: { type: DataTypes.UUID, allowNull: false },
			fileName: { type: DataTypes.STRING(120), allowNull: false },
			certificateId: { type: DataTypes.UUID, allowNull: false },
			madeAt: { type: DataTypes.DATE(3), allowNull: false }
		},
		{ sequelize, modelName: 'Report', tableName: 'reports' }
	);
}
