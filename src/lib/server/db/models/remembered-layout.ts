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
	declare withdrawnAt: Date | null;
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
			withdrawnAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'RememberedLayout', tableName: 'layouts' }
	);
}
