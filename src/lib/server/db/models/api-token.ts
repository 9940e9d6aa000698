import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A secret by which another program acts as a user, kept as its hash until it is revoked. */
export class ApiToken extends Model<InferAttributes<ApiToken>, InferCreationAttributes<ApiToken>> {
	declare id: string;
	declare userId: string;
	declare tokenSha256: string;
	/** What it is for, in its owner's words. */
	declare name: CreationOptional<string>;
	declare createdAt: Date;
	declare lastUsedAt: CreationOptional<Date | null>;
	declare revokedAt: CreationOptional<Date | null>;
}

export function defineApiToken(sequelize: Sequelize): void {
	ApiToken.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			userId: { type: DataTypes.UUID, allowNull: false },
			tokenSha256: { type: DataTypes.CHAR(64), allowNull: false, field: 'token_sha256' },
			name: { type: DataTypes.STRING(80), allowNull: false, defaultValue: '' },
			createdAt: { type: DataTypes.DATE(3), allowNull: false },
			lastUsedAt: { type: DataTypes.DATE(3), allowNull: true },
			revokedAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'ApiToken', tableName: 'api_tokens' }
	);
}
