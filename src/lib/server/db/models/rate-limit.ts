import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** Attempts in a window of time; kept here because the app holds no state. */
export class RateLimit extends Model<InferAttributes<RateLimit>, InferCreationAttributes<RateLimit>> {
	declare name: string;
	declare windowStartedAt: Date;
	declare attempts: CreationOptional<number>;
}

export function defineRateLimit(sequelize: Sequelize): void {
	RateLimit.init(
		{
			name: { type: DataTypes.STRING(160), primaryKey: true, allowNull: false },
			windowStartedAt: { type: DataTypes.DATE(3), allowNull: false },
			attempts: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 }
		},
		{ sequelize, modelName: 'RateLimit', tableName: 'rate_limits' }
	);
}
