import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** The last number given per site, year and kind; numbers are never reused. */
export class NumberSeries extends Model<
	InferAttributes<NumberSeries>,
	InferCreationAttributes<NumberSeries>
> {
	declare siteId: string;
	declare year: number;
	declare kind: 'docket' | 'notice' | 'claim';
	declare last: number;
}

export function defineNumberSeries(sequelize: Sequelize): void {
	NumberSeries.init(
		{
			siteId: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			year: { type: DataTypes.INTEGER, primaryKey: true, allowNull: false },
			kind: { type: DataTypes.ENUM('docket', 'notice', 'claim'), primaryKey: true, allowNull: false },
			last: { type: DataTypes.INTEGER, allowNull: false }
		},
		{ sequelize, modelName: 'NumberSeries', tableName: 'number_series' }
	);
}
