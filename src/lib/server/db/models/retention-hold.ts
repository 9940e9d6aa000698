import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A docket kept beyond its period because somebody said so. */
export class RetentionHold extends Model<
	InferAttributes<RetentionHold>,
	InferCreationAttributes<RetentionHold>
> {
	declare id: string;
	declare shipmentId: string;
	declare reason: string;
	declare putBy: string;
	declare putAt: Date;
	declare liftedBy: string | null;
	declare liftedAt: Date | null;
	declare liftReason: string | null;
}

export function defineRetentionHold(sequelize: Sequelize): void {
	RetentionHold.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			reason: { type: DataTypes.STRING(1000), allowNull: false },
			putBy: { type: DataTypes.UUID, allowNull: false },
			putAt: { type: DataTypes.DATE(3), allowNull: false },
			liftedBy: { type: DataTypes.UUID, allowNull: true },
			liftedAt: { type: DataTypes.DATE(3), allowNull: true },
			liftReason: { type: DataTypes.STRING(1000), allowNull: true }
		},
		{ sequelize, modelName: 'RetentionHold', tableName: 'retention_holds' }
	);
}
