import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A revocable session opened by a mailed link, for one docket and one contact. */
export class LinkSession extends Model<InferAttributes<LinkSession>, InferCreationAttributes<LinkSession>> {
	declare id: string;
	declare contactId: string;
	declare partnerId: string;
	declare shipmentId: string;
	declare createdAt: Date;
	declare expiresAt: Date;
	declare revokedAt: Date | null;
}

export function defineLinkSession(sequelize: Sequelize): void {
	LinkSession.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			contactId: { type: DataTypes.UUID, allowNull: false },
			partnerId: { type: DataTypes.UUID, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			createdAt: { type: DataTypes.DATE(3), allowNull: false },
			expiresAt: { type: DataTypes.DATE(3), allowNull: false },
			revokedAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'LinkSession', tableName: 'link_sessions' }
	);
}
