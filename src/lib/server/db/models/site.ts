import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A receiving place: its zone, units and number prefix. */
export class Site extends Model<InferAttributes<Site>, InferCreationAttributes<Site>> {
	declare id: string;
	declare organisationId: string;
	declare code: string;
	declare name: string;
	declare address: string;
	declare gln: string | null;
	declare zone: string;
	declare temperatureUnit: 'celsius' | 'fahrenheit';
	declare pageSize: 'a4' | 'letter';
	declare currency: string;
	declare opening: unknown;
	declare docks: unknown;
	declare createdAt: Date;
	declare switchedOffAt: Date | null;
}

export function defineSite(sequelize: Sequelize): void {
	Site.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			organisationId: { type: DataTypes.UUID, allowNull: false },
			code: { type: DataTypes.STRING(8), allowNull: false },
			name: { type: DataTypes.STRING(120), allowNull: false },
			address: { type: DataTypes.STRING(300), allowNull: false },
			gln: { type: DataTypes.CHAR(13), allowNull: true },
			zone: { type: DataTypes.STRING(64), allowNull: false },
			temperatureUnit: { type: DataTypes.ENUM('celsius', 'fahrenheit'), allowNull: false },
			pageSize: { type: DataTypes.ENUM('a4', 'letter'), allowNull: false },
			currency: { type: DataTypes.CHAR(3), allowNull: false },
			opening: { type: DataTypes.JSON, allowNull: false },
			docks: { type: DataTypes.JSON, allowNull: false },
			createdAt: { type: DataTypes.DATE(3), allowNull: false },
			switchedOffAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'Site', tableName: 'sites' }
	);
}
