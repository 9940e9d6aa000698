import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** The sites a user works at. */
export class UserSite extends Model<InferAttributes<UserSite>, InferCreationAttributes<UserSite>> {
	declare userId: string;
	declare siteId: string;
}

export function defineUserSite(sequelize: Sequelize): void {
	UserSite.init(
		{
			userId: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			siteId: { type: DataTypes.UUID, primaryKey: true, allowNull: false }
		},
		{ sequelize, modelName: 'UserSite', tableName: 'user_sites' }
	);
}
