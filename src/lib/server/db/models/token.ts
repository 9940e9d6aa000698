import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A secret sent by mail, kept as its hash, used once. */
export class Token extends Model<InferAttributes<Token>, InferCreationAttributes<Token>> {
	declare id: string;
	declare kind: 'sign-in' | 'invitation' | 'notice';
	declare tokenSha256: string;
	declare userId: string | null;
	declare contactId: string | null;
	declare shipmentId: string | null;
	declare noticeId: string | null;
	declare createdAt: Date;
	declare expiresAt: Date;
	declare usedAt: Date | null;
}

export function defineToken(sequelize: Sequelize): void {
	Token.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			kind: { type: DataTypes.ENUM('sign-in', 'invitation', 'notice'), allowNull: false },
			tokenSha256: { type: DataTypes.CHAR(64), allowNull: false, field: 'token_sha256' },
			userId: { type: DataTypes.UUID, allowNull: true },
			contactId: { type: DataTypes.UUID, allowNull: true },
			shipmentId: { type: DataTypes.UUID, allowNull: true },
			noticeId: { type: DataTypes.UUID, allowNull: true },
			createdAt: { type: DataTypes.DATE(3), allowNull: false },
			expiresAt: { type: DataTypes.DATE(3), allowNull: false },
			usedAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'Token', tableName: 'tokens' }
	);
}
