import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** The organisation's sealing certificates; the keys lie in the key folder. */
export class Certificate extends Model<InferAttributes<Certificate>, InferCreationAttributes<Certificate>> {
	declare id: string;
	declare organisationId: string;
	declare subject: string;
	declare serial: string;
	declare sha256: string;
	declare pem: CreationOptional<string>;
	declare validFrom: Date;
	declare validUntil: Date;
	declare createdAt: Date;
	declare retiredAt: Date | null;
	/** When the admins were told that it ends. */
	declare warnedAt: Date | null;
}

export function defineCertificate(sequelize: Sequelize): void {
	Certificate.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			organisationId: { type: DataTypes.UUID, allowNull: false },
			subject: { type: DataTypes.STRING(300), allowNull: false },
			serial: { type: DataTypes.STRING(64), allowNull: false },
			sha256: { type: DataTypes.CHAR(64), allowNull: false },
			pem: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
			validFrom: { type: DataTypes.DATE(3), allowNull: false },
			validUntil: { type: DataTypes.DATE(3), allowNull: false },
			createdAt: { type: DataTypes.DATE(3), allowNull: false },
			retiredAt: { type: DataTypes.DATE(3), allowNull: true },
			warnedAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'Certificate', tableName: 'certificates' }
	);
}
