import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** The stored text an entry hashes; blanked by retention, and the chain still verifies. */
export class AuditPayload extends Model<
	InferAttributes<AuditPayload>,
	InferCreationAttributes<AuditPayload>
> {
	declare entryId: string;
	declare text: string | null;
}

export function defineAuditPayload(sequelize: Sequelize): void {
	AuditPayload.init(
		{
			entryId: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			text: { type: DataTypes.TEXT('long'), allowNull: true }
		},
		{ sequelize, modelName: 'AuditPayload', tableName: 'audit_payloads' }
	);
}
