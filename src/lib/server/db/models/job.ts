import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** Work written in the transaction that causes it; leased by a worker, retried, never lost. */
export class Job extends Model<InferAttributes<Job>, InferCreationAttributes<Job>> {
	declare id: string;
	declare kind: string;
	declare payload: string;
	declare dedupeKey: string | null;
	declare runAt: Date;
	declare attempts: CreationOptional<number>;
	declare leasedBy: string | null;
	declare leasedUntil: Date | null;
	declare doneAt: Date | null;
	declare failedAt: Date | null;
	declare lastError: string | null;
	declare createdAt: Date;
}

export function defineJob(sequelize: Sequelize): void {
	Job.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			kind: { type: DataTypes.STRING(40), allowNull: false },
			payload: { type: DataTypes.TEXT('long'), allowNull: false },
			dedupeKey: { type: DataTypes.STRING(120), allowNull: true },
			runAt: { type: DataTypes.DATE(3), allowNull: false },
			attempts: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
			leasedBy: { type: DataTypes.STRING(80), allowNull: true },
			leasedUntil: { type: DataTypes.DATE(3), allowNull: true },
			doneAt: { type: DataTypes.DATE(3), allowNull: true },
			failedAt: { type: DataTypes.DATE(3), allowNull: true },
			lastError: { type: DataTypes.TEXT, allowNull: true },
			createdAt: { type: DataTypes.DATE(3), allowNull: false }
		},
		{ sequelize, modelName: 'Job', tableName: 'jobs' }
	);
}
