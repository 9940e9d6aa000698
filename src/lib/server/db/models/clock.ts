import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A deadline that runs on a docket, notice or claim. */
export class Clock extends Model<InferAttributes<Clock>, InferCreationAttributes<Clock>> {
	declare id: string;
	declare shipmentId: string;
	declare noticeId: string | null;
	declare claimId: string | null;
	declare name: string;
	declare basis: string;
	declare startsAt: Date;
	declare deadlineAt: Date;
	declare metAt: Date | null;
	declare metBy: string | null;
}

export function defineClock(sequelize: Sequelize): void {
	Clock.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			noticeId: { type: DataTypes.UUID, allowNull: true },
			claimId: { type: DataTypes.UUID, allowNull: true },
			name: { type: DataTypes.STRING(120), allowNull: false },
			basis: { type: DataTypes.STRING(160), allowNull: false },
			startsAt: { type: DataTypes.DATE(3), allowNull: false },
			deadlineAt: { type: DataTypes.DATE(3), allowNull: false },
			metAt: { type: DataTypes.DATE(3), allowNull: true },
			metBy: { type: DataTypes.STRING(200), allowNull: true }
		},
		{ sequelize, modelName: 'Clock', tableName: 'clocks' }
	);
}
