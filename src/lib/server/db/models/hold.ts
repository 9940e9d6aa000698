import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A docket put on hold, and lifted. */
export class Hold extends Model<InferAttributes<Hold>, InferCreationAttributes<Hold>> {
	declare id: string;
	declare shipmentId: string;
	declare putBy: string;
	declare putAt: Date;
	declare reason: CreationOptional<string>;
	declare awaited: string | null;
	declare untilAt: Date | null;
	declare liftedBy: string | null;
	declare liftedAt: Date | null;
}

export function defineHold(sequelize: Sequelize): void {
	Hold.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			putBy: { type: DataTypes.UUID, allowNull: false },
			putAt: { type: DataTypes.DATE(3), allowNull: false },
			reason: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
			awaited: { type: DataTypes.STRING(400), allowNull: true },
			untilAt: { type: DataTypes.DATE(3), allowNull: true },
			liftedBy: { type: DataTypes.UUID, allowNull: true },
			liftedAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'Hold', tableName: 'holds' }
	);
}
