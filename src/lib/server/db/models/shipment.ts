import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** One load under one set of papers; its page is the docket. Its stage follows from these facts. */
export class Shipment extends Model<InferAttributes<Shipment>, InferCreationAttributes<Shipment>> {
	declare id: string;
	declare siteId: string;
	declare number: string;
	declare title: string;
	declare supplierId: string;
	declare carrierId: string | null;
	declare laneId: string | null;
	declare visitId: string | null;
	declare compartmentId: string | null;
	declare purchaseOrder: string | null;
	declare billOfLading: string | null;
	declare mode: 'road' | 'sea' | 'air' | 'rail';
	declare vehicle: string | null;
	declare seal: string | null;
	declare dock: string | null;
	declare termsOfSale: string | null;
	declare rejectWithinHours: number | null;
	declare rejectBasis: string | null;
	declare dueAt: Date | null;
	declare arrivedAt: Date | null;
	declare decidedAt: Date | null;
	declare verdict: 'accepted' | 'conditions' | 'part' | 'rejected' | null;
	declare createdBy: string | null;
	/** Who of QA has taken its review on. */
	declare takenBy: CreationOptional<string | null>;
	declare takenAt: CreationOptional<Date | null>;
	declare createdAt: Date;
	declare cancelledAt: Date | null;
	declare version: CreationOptional<number>;
}

export function defineShipment(sequelize: Sequelize): void {
	Shipment.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			siteId: { type: DataTypes.UUID, allowNull: false },
			number: { type: DataTypes.STRING(24), allowNull: false },
			title: { type: DataTypes.STRING(200), allowNull: false },
			supplierId: { type: DataTypes.UUID, allowNull: false },
			carrierId: { type: DataTypes.UUID, allowNull: true },
			laneId: { type: DataTypes.UUID, allowNull: true },
			visitId: { type: DataTypes.UUID, allowNull: true },
			compartmentId: { type: DataTypes.UUID, allowNull: true },
			purchaseOrder: { type: DataTypes.STRING(60), allowNull: true },
			billOfLading: { type: DataTypes.STRING(60), allowNull: true },
			mode: { type: DataTypes.ENUM('road', 'sea', 'air', 'rail'), allowNull: false },
			vehicle: { type: DataTypes.STRING(60), allowNull: true },
			seal: { type: DataTypes.STRING(60), allowNull: true },
			dock: { type: DataTypes.STRING(40), allowNull: true },
			termsOfSale: { type: DataTypes.STRING(120), allowNull: true },
			rejectWithinHours: { type: DataTypes.DOUBLE, allowNull: true },
			rejectBasis: { type: DataTypes.STRING(120), allowNull: true },
			dueAt: { type: DataTypes.DATE(3), allowNull: true },
			arrivedAt: { type: DataTypes.DATE(3), allowNull: true },
			decidedAt: { type: DataTypes.DATE(3), allowNull: true },
			verdict: { type: DataTypes.ENUM('accepted', 'conditions', 'part', 'rejected'), allowNull: true },
			createdBy: { type: DataTypes.UUID, allowNull: true },
			takenBy: { type: DataTypes.UUID, allowNull: true },
			takenAt: { type: DataTypes.DATE(3), allowNull: true },
			createdAt: { type: DataTypes.DATE(3), allowNull: false },
			cancelledAt: { type: DataTypes.DATE(3), allowNull: true },
			version: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 }
		},
		{ sequelize, modelName: 'Shipment', tableName: 'shipments' }
	);
}
