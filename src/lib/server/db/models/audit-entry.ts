import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';
import type { SessionKind } from '../../context';

/** One change, chained to the one before. Append only. */
export class AuditEntry extends Model<InferAttributes<AuditEntry>, InferCreationAttributes<AuditEntry>> {
	declare id: string;
	declare chainId: string;
	declare seq: number;
	declare type: string;
	declare actorId: string | null;
	declare actorKind: 'user' | 'link' | 'system';
	/** Null in entries from before it was kept. */
	declare sessionKind: SessionKind | null;
	declare occurredAt: Date;
	declare requestId: string;
	declare address: string;
	declare payloadSha256: string;
	declare previousSha256: string;
	declare sha256: string;
}

export function defineAuditEntry(sequelize: Sequelize): void {
	AuditEntry.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			chainId: { type: DataTypes.UUID, allowNull: false },
			seq: { type: DataTypes.INTEGER, allowNull: false },
			type: { type: DataTypes.STRING(60), allowNull: false },
			actorId: { type: DataTypes.UUID, allowNull: true },
			actorKind: { type: DataTypes.ENUM('user', 'link', 'system'), allowNull: false },
			sessionKind: { type: DataTypes.STRING(12), allowNull: true },
			occurredAt: { type: DataTypes.DATE(3), allowNull: false },
			requestId: { type: DataTypes.STRING(40), allowNull: false },
			address: { type: DataTypes.STRING(64), allowNull: false },
			payloadSha256: { type: DataTypes.CHAR(64), allowNull: false, field: 'payload_sha256' },
			previousSha256: { type: DataTypes.CHAR(64), allowNull: false, field: 'previous_sha256' },
			sha256: { type: DataTypes.CHAR(64), allowNull: false }
		},
		{ sequelize, modelName: 'AuditEntry', tableName: 'audit_entries' }
	);
}
