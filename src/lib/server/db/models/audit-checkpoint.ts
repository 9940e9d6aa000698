import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** The heads of all chains at one moment, chained. */
export class AuditCheckpoint extends Model<
	InferAttributes<AuditCheckpoint>,
	InferCreationAttributes<AuditCheckpoint>
> {
	declare id: string;
	declare seq: number;
	declare heads: string;
	declare previousSha256: string;
	declare sha256: string;
	declare madeAt: Date;
}

export function defineAuditCheckpoint(sequelize: Sequelize): void {
	AuditCheckpoint.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			seq: { type: DataTypes.INTEGER, allowNull: false },
			heads: { type: DataTypes.TEXT('long'), allowNull: false },
			previousSha256: { type: DataTypes.CHAR(64), allowNull: false, field: 'previous_sha256' },
			sha256: { type: DataTypes.CHAR(64), allowNull: false },
			madeAt: { type: DataTypes.DATE(3), allowNull: false }
		},
		{ sequelize, modelName: 'AuditCheckpoint', tableName: 'audit_checkpoints' }
	);
}
