import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** Bytes by their hash. Written to the store before the row that names them. */
export class StoredFile extends Model<InferAttributes<StoredFile>, InferCreationAttributes<StoredFile>> {
	declare id: string;
	declare sha256: string;
	declare bytes: number;
	declare mediaType: string;
	declare storedAt: Date;
	/** When retention took the bytes away; the row and its hash stay. */
	declare deletedAt: Date | null;
}

export function defineStoredFile(sequelize: Sequelize): void {
	StoredFile.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			sha256: { type: DataTypes.CHAR(64), allowNull: false },
			bytes: { type: DataTypes.BIGINT, allowNull: false },
			mediaType: { type: DataTypes.STRING(100), allowNull: false },
			storedAt: { type: DataTypes.DATE(3), allowNull: false },
			deletedAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'StoredFile', tableName: 'files' }
	);
}
