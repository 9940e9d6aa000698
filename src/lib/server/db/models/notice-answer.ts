import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** What a partner answered. */
export class NoticeAnswer extends Model<
	InferAttributes<NoticeAnswer>,
	InferCreationAttributes<NoticeAnswer>
> {
	declare id: string;
	declare noticeId: string;
	declare kind: 'acknowledge' | 'dispute';
	declare disputed: unknown;
	declare whatIsWrong: CreationOptional<string>;
	declare whatWillBeDone: CreationOptional<string>;
	declare who: string;
	declare doneByOn: string | null;
	declare fileId: string | null;
	declare answeredBy: string;
	declare answeredAt: Date;
}

export function defineNoticeAnswer(sequelize: Sequelize): void {
	NoticeAnswer.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			noticeId: { type: DataTypes.UUID, allowNull: false },
			kind: { type: DataTypes.ENUM('acknowledge', 'dispute'), allowNull: false },
			disputed: { type: DataTypes.JSON, allowNull: false },
			whatIsWrong: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
			whatWillBeDone: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
			who: { type: DataTypes.STRING(120), allowNull: false },
			doneByOn: { type: DataTypes.DATEONLY, allowNull: true },
			fileId: { type: DataTypes.UUID, allowNull: true },
			answeredBy: { type: DataTypes.STRING(254), allowNull: false },
			answeredAt: { type: DataTypes.DATE(3), allowNull: false }
		},
		{ sequelize, modelName: 'NoticeAnswer', tableName: 'notice_answers' }
	);
}
