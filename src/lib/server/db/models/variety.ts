import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A variety or pack of a product with a spec of its own. */
export class Variety extends Model<InferAttributes<Variety>, InferCreationAttributes<Variety>> {
	declare id: string;
	declare productId: string;
	declare name: string;
}

export function defineVariety(sequelize: Sequelize): void {
	Variety.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			productId: { type: DataTypes.UUID, allowNull: false },
			name: { type: DataTypes.STRING(120), allowNull: false }
		},
		{ sequelize, modelName: 'Variety', tableName: 'varieties' }
	);
}
