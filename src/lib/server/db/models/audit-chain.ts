import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** The head of one hash chain: a docket's, else a site's or an account's. */
export class AuditChain extends Model<InferAttributes<AuditChain>, InferCreationAttributes<AuditChain>> {
	declare id: string;
	declare scope: 'shipment' | 'site' | 'account' | 'organisation';
	declare length: CreationOptional<number>;
	declare headSha256: string;
	/** How much of it the checkpoints cover. */
	declare checkpointedLength: CreationOptional<number>;
}

export function defineAuditChain(sequelize: Sequelize): void {
	AuditChain.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			scope: { type: DataTypes.ENUM('shipment', 'site', 'account', 'organisation'), allowNull: false },
			length: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
			headSha256: { type: DataTypes.CHAR(64), allowNull: false, field: 'head_sha256' },
			checkpointedLength: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 }
		},
		{ sequelize, modelName: 'AuditChain', tableName: 'audit_chains' }
	);
}
