import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** Days on which a site does not work. */
export class SiteHoliday extends Model<InferAttributes<SiteHoliday>, InferCreationAttributes<SiteHoliday>> {
	declare id: string;
	declare siteId: string;
	declare heldOn: string;
	declare name: string;
}

export function defineSiteHoliday(sequelize: Sequelize): void {
	SiteHoliday.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			siteId: { type: DataTypes.UUID, allowNull: false },
			heldOn: { type: DataTypes.DATEONLY, allowNull: false },
			name: { type: DataTypes.STRING(120), allowNull: false }
		},
		{ sequelize, modelName: 'SiteHoliday', tableName: 'site_holidays' }
	);
}
