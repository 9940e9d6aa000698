import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** Pallets or cases of a line with one outcome and one whereabouts. */
export class LineGroup extends Model<InferAttributes<LineGroup>, InferCreationAttributes<LineGroup>> {
	declare id: string;
	declare lineId: string;
	declare ordinal: number;
	declare name: string;
	declare cases: number;
	declare pallets: number;
	declare whereabouts: 'dock' | 'store' | 'quarantine' | 'returned' | 'dumped';
	declare place: string;
}

export function defineLineGroup(sequelize: Sequelize): void {
	LineGroup.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			lineId: { type: DataTypes.UUID, allowNull: false },
			ordinal: { type: DataTypes.INTEGER, allowNull: false },
			name: { type: DataTypes.STRING(80), allowNull: false },
			cases: { type: DataTypes.INTEGER, allowNull: false },
			pallets: { type: DataTypes.INTEGER, allowNull: false },
			whereabouts: {
				type: DataTypes.ENUM('dock', 'store', 'quarantine', 'returned', 'dumped'),
				allowNull: false
			},
			place: { type: DataTypes.STRING(80), allowNull: false }
		},
		{ sequelize, modelName: 'LineGroup', tableName: 'line_groups' }
	);
}
