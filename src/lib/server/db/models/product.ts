import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** What is bought; specs hang on it. */
export class Product extends Model<InferAttributes<Product>, InferCreationAttributes<Product>> {
	declare id: string;
	declare name: string;
	declare family: string;
	declare countUnit: string;
	declare createdAt: Date;
	declare switchedOffAt: Date | null;
}

export function defineProduct(sequelize: Sequelize): void {
	Product.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			name: { type: DataTypes.STRING(120), allowNull: false },
			family: { type: DataTypes.STRING(60), allowNull: false },
			countUnit: { type: DataTypes.STRING(30), allowNull: false },
			createdAt: { type: DataTypes.DATE(3), allowNull: false },
			switchedOffAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'Product', tableName: 'products' }
	);
}
