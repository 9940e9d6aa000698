import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** Answers remembered for files of one make. */
export class RememberedLayout extends Model<
	InferAttributes<RememberedLayout>,
	InferCreationAttributes<RememberedLayout>
> {
	declare id: string;
	declare fingerprint: string;
	declare version: number;
	declare partnerId: string | null;
	declare answers: unknown;
	declare confirmedBy: string;
	declare confirmedAt: Date;
	/** The read it was confirmed on, and that file's name. */
	declare sourceReadId: string | null;
	declare sourceName: string | null;
	declare withdrawnAt: Date | null;
	declare withdrawnBy: string | null;
	declare withdrawnReason: string | null;
}

export function defineRememberedLayout(sequelize: Sequelize): void {
	RememberedLayout.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			fingerprint: { type: DataTypes.CHAR(64), allowNull: false },
			version: { type: DataTypes.INTEGER, allowNull: false },
			partnerId: { type: DataTypes.UUID, allowNull: true },
			answers: { type: DataTypes.JSON, allowNull: false },
			confirmedBy: { type: DataTypes.UUID, allowNull: false },
			confirmedAt: { type: DataTypes.DATE(3), allowNull: false },
			sourceReadId: { type: DataTypes.UUID, allowNull: true },
			sourceName: { type: DataTypes.STRING(180), allowNull: true },
			withdrawnAt: { type: DataTypes.DATE(3), allowNull: true },
			withdrawnBy: { type: DataTypes.UUID, allowNull: true },
			withdrawnReason: { type: DataTypes.STRING(300), allowNull: true }
		},
		{ sequelize, modelName: 'RememberedLayout', tableName: 'layouts' }
	);
}
