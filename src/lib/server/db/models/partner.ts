import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A supplier, carrier, store or customer. */
export class Partner extends Model<InferAttributes<Partner>, InferCreationAttributes<Partner>> {
	declare id: string;
	declare name: string;
	declare isSupplier: boolean;
	declare isCarrier: boolean;
	declare isStore: boolean;
	declare isCustomer: boolean;
	declare gln: string | null;
	declare address: string;
	declare countryCode: string | null;
	declare note: CreationOptional<string>;
	declare createdAt: Date;
	declare switchedOffAt: Date | null;
}

export function definePartner(sequelize: Sequelize): void {
	Partner.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			name: { type: DataTypes.STRING(120), allowNull: false },
			isSupplier: { type: DataTypes.BOOLEAN, allowNull: false },
			isCarrier: { type: DataTypes.BOOLEAN, allowNull: false },
			isStore: { type: DataTypes.BOOLEAN, allowNull: false },
			isCustomer: { type: DataTypes.BOOLEAN, allowNull: false },
			gln: { type: DataTypes.CHAR(13), allowNull: true },
			address: { type: DataTypes.STRING(300), allowNull: false },
			countryCode: { type: DataTypes.CHAR(2), allowNull: true },
			note: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
			createdAt: { type: DataTypes.DATE(3), allowNull: false },
			switchedOffAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'Partner', tableName: 'partners' }
	);
}
