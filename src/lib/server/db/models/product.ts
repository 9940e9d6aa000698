import {
	DataTypes,
	Model,
	type CreationOptional,
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
	/** FindingGrades by code. */
	declare findingGrades: CreationOptional<Record<string, string>>;
	declare minimumDatedDays: number | null;
	declare isNotOlderThanLast: CreationOptional<boolean>;
	declare isLoggerRequired: CreationOptional<boolean>;
	/** The dock itself may accept what no finding holds. */
	declare dockMayAccept: CreationOptional<boolean>;
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
			findingGrades: { type: DataTypes.JSON, allowNull: false, defaultValue: {} },
			minimumDatedDays: { type: DataTypes.INTEGER, allowNull: true },
			isNotOlderThanLast: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
			isLoggerRequired: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
			dockMayAccept: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
			createdAt: { type: DataTypes.DATE(3), allowNull: false },
			switchedOffAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'Product', tableName: 'products' }
	);
}
