import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A product and lot under the papers. */
export class ShipmentLine extends Model<
	InferAttributes<ShipmentLine>,
	InferCreationAttributes<ShipmentLine>
> {
	declare id: string;
	declare shipmentId: string;
	declare ordinal: number;
	declare productId: string;
	declare varietyId: string | null;
	declare description: string;
	declare lot: string;
	declare gtin: string | null;
	declare casesAdvised: number;
	declare casesReceived: number | null;
	declare palletsAdvised: number;
	declare grossGrams: number | null;
	declare valueMinor: number | null;
	declare currency: string | null;
	declare bestBeforeOn: string | null;
	declare neededHours: number | null;
	declare openingKind: 'undeclared' | 'declared' | 'computed';
	declare openingHours: number | null;
	declare openingPlusMinusHours: number | null;
	declare openingSinceAt: Date | null;
	declare openingCelsius: number | null;
	declare openingPlusMinusCelsius: number | null;
	declare openingBasis: string | null;
	/** Null: the shipment's own. */
	declare compartmentId: string | null;
}

export function defineShipmentLine(sequelize: Sequelize): void {
	ShipmentLine.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			ordinal: { type: DataTypes.INTEGER, allowNull: false },
			productId: { type: DataTypes.UUID, allowNull: false },
			varietyId: { type: DataTypes.UUID, allowNull: true },
			description: { type: DataTypes.STRING(160), allowNull: false },
			lot: { type: DataTypes.STRING(60), allowNull: false },
			gtin: { type: DataTypes.CHAR(14), allowNull: true },
			casesAdvised: { type: DataTypes.INTEGER, allowNull: false },
			casesReceived: { type: DataTypes.INTEGER, allowNull: true },
			palletsAdvised: { type: DataTypes.INTEGER, allowNull: false },
			grossGrams: { type: DataTypes.BIGINT, allowNull: true },
			valueMinor: { type: DataTypes.BIGINT, allowNull: true },
			currency: { type: DataTypes.CHAR(3), allowNull: true },
			bestBeforeOn: { type: DataTypes.DATEONLY, allowNull: true },
			neededHours: { type: DataTypes.DOUBLE, allowNull: true },
			openingKind: { type: DataTypes.ENUM('undeclared', 'declared', 'computed'), allowNull: false },
			openingHours: { type: DataTypes.DOUBLE, allowNull: true },
			openingPlusMinusHours: { type: DataTypes.DOUBLE, allowNull: true },
			openingSinceAt: { type: DataTypes.DATE(3), allowNull: true },
			openingCelsius: { type: DataTypes.DOUBLE, allowNull: true },
			openingPlusMinusCelsius: { type: DataTypes.DOUBLE, allowNull: true },
			compartmentId: { type: DataTypes.UUID, allowNull: true },
			openingBasis: { type: DataTypes.STRING(200), allowNull: true }
		},
		{ sequelize, modelName: 'ShipmentLine', tableName: 'shipment_lines' }
	);
}
