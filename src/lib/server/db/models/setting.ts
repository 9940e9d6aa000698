import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** Facts about this installation, such as whether the demo was loaded. */
export class Setting extends Model<InferAttributes<Setting>, InferCreationAttributes<Setting>> {
	declare name: string;
	declare value: CreationOptional<string>;
}

export function defineSetting(sequelize: Sequelize): void {
	Setting.init(
		{
			name: { type: DataTypes.STRING(60), primaryKey: true, allowNull: false },
			value: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' }
		},
		{ sequelize, modelName: 'Setting', tableName: 'settings' }
	);
}
