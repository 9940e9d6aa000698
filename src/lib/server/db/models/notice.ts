import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A message to a partner about a decision. */
export class Notice extends Model<InferAttributes<Notice>, InferCreationAttributes<Notice>> {
	declare id: string;
	declare number: string;
	declare shipmentId: string;
	declare dispositionId: string;
	declare partnerId: string;
	declare contactId: string | null;
	declare state: 'queued' | 'sent' | 'failed';
	declare subject: string;
	declare answerByAt: Date | null;
	declare createdAt: Date;
	declare sentAt: Date | null;
	declare messageId: string | null;
	declare firstOpenedAt: Date | null;
}

export function defineNotice(sequelize: Sequelize): void {
	Notice.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			number: { type: DataTypes.STRING(24), allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			dispositionId: { type: DataTypes.UUID, allowNull: false },
			partnerId: { type: DataTypes.UUID, allowNull: false },
			contactId: { type: DataTypes.UUID, allowNull: true },
			state: { type: DataTypes.ENUM('queued', 'sent', 'failed'), allowNull: false },
			subject: { type: DataTypes.STRING(300), allowNull: false },
			answerByAt: { type: DataTypes.DATE(3), allowNull: true },
			createdAt: { type: DataTypes.DATE(3), allowNull: false },
			sentAt: { type: DataTypes.DATE(3), allowNull: true },
			messageId: { type: DataTypes.STRING(200), allowNull: true },
			firstOpenedAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'Notice', tableName: 'notices' }
	);
}
