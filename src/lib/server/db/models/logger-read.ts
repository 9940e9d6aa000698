import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** One uploaded export on one docket. */
export class LoggerRead extends Model<InferAttributes<LoggerRead>, InferCreationAttributes<LoggerRead>> {
	declare id: string;
	declare shipmentId: string;
	declare fileId: string;
	declare part: number;
	declare fileName: string;
	declare state: 'question' | 'ok' | 'refused' | 'withdrawn';
	declare answers: unknown;
	declare layoutId: string | null;
	declare understanding: string | null;
	declare refusalCode: string | null;
	declare readerVersion: string;
	declare zoneDataVersion: string | null;
	declare uploadedBy: string;
	declare uploadedAt: Date;
	declare keptAt: Date | null;
	declare askedQaAt: Date | null;
}

export function defineLoggerRead(sequelize: Sequelize): void {
	LoggerRead.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			fileId: { type: DataTypes.UUID, allowNull: false },
			part: { type: DataTypes.INTEGER, allowNull: false },
			fileName: { type: DataTypes.STRING(200), allowNull: false },
			state: { type: DataTypes.ENUM('question', 'ok', 'refused', 'withdrawn'), allowNull: false },
			answers: { type: DataTypes.JSON, allowNull: false },
			layoutId: { type: DataTypes.UUID, allowNull: true },
			understanding: { type: DataTypes.TEXT('long'), allowNull: true },
			refusalCode: { type: DataTypes.STRING(40), allowNull: true },
			readerVersion: { type: DataTypes.STRING(20), allowNull: false },
			zoneDataVersion: { type: DataTypes.STRING(20), allowNull: true },
			uploadedBy: { type: DataTypes.UUID, allowNull: false },
			uploadedAt: { type: DataTypes.DATE(3), allowNull: false },
			keptAt: { type: DataTypes.DATE(3), allowNull: true },
			askedQaAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'LoggerRead', tableName: 'logger_reads' }
	);
}
