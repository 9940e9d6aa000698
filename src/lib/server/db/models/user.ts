import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** Somebody who signs in. */
export class User extends Model<InferAttributes<User>, InferCreationAttributes<User>> {
	declare id: string;
	declare email: string;
	declare name: string;
	declare title: string;
	declare passwordHash: string | null;
	declare roles: unknown;
	declare partnerId: string | null;
	declare tokenVersion: CreationOptional<number>;
	declare failedPasswords: CreationOptional<number>;
	declare lockedAt: Date | null;
	/** May determine, in writing, what a stop means for the goods. */
	declare isQualifiedPerson: CreationOptional<boolean>;
	declare temperatureUnit: 'celsius' | 'fahrenheit' | null;
	declare createdAt: Date;
	declare invitedAt: Date | null;
	declare lastSignInAt: Date | null;
	declare switchedOffAt: Date | null;
	/** Secret of the second factor, sealed; in force once `secondFactorSince` is set. */
	declare secondFactorSealed: CreationOptional<string | null>;
	declare secondFactorSince: CreationOptional<Date | null>;
	/** The last time step a code was used of. */
	declare secondFactorStep: CreationOptional<number | null>;
	/** The session in which every component of a signature was last shown, and when one was last used there. */
	declare signingSessionId: CreationOptional<string | null>;
	declare signingSessionAt: CreationOptional<Date | null>;
}

export function defineUser(sequelize: Sequelize): void {
	User.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			email: { type: DataTypes.STRING(254), allowNull: false },
			name: { type: DataTypes.STRING(120), allowNull: false },
			title: { type: DataTypes.STRING(120), allowNull: false },
			passwordHash: { type: DataTypes.STRING(255), allowNull: true },
			roles: { type: DataTypes.JSON, allowNull: false },
			partnerId: { type: DataTypes.UUID, allowNull: true },
			tokenVersion: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
			failedPasswords: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
			lockedAt: { type: DataTypes.DATE(3), allowNull: true },
			isQualifiedPerson: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
			temperatureUnit: { type: DataTypes.ENUM('celsius', 'fahrenheit'), allowNull: true },
			createdAt: { type: DataTypes.DATE(3), allowNull: false },
			invitedAt: { type: DataTypes.DATE(3), allowNull: true },
			lastSignInAt: { type: DataTypes.DATE(3), allowNull: true },
			switchedOffAt: { type: DataTypes.DATE(3), allowNull: true },
			secondFactorSealed: { type: DataTypes.STRING(255), allowNull: true },
			secondFactorSince: { type: DataTypes.DATE(3), allowNull: true },
			secondFactorStep: { type: DataTypes.BIGINT, allowNull: true },
			signingSessionId: { type: DataTypes.UUID, allowNull: true },
			signingSessionAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'User', tableName: 'users' }
	);
}
