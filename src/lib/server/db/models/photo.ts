import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A picture taken at the door. */
export class Photo extends Model<InferAttributes<Photo>, InferCreationAttributes<Photo>> {
	declare id: string;
	declare shipmentId: string;
	declare fileId: string;
	declare kind: 'load' | 'seal' | 'set-point' | 'papers' | 'damage' | 'pulp' | 'other';
	declare caption: string;
	declare takenBy: string;
	declare takenAt: Date;
}

export function definePhoto(sequelize: Sequelize): void {
	Photo.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			fileId: { type: DataTypes.UUID, allowNull: false },
			kind: {
				type: DataTypes.ENUM('load', 'seal', 'set-point', 'papers', 'damage', 'pulp', 'other'),
				allowNull: false
			},
			caption: { type: DataTypes.STRING(200), allowNull: false },
			takenBy: { type: DataTypes.UUID, allowNull: false },
			takenAt: { type: DataTypes.DATE(3), allowNull: false }
		},
		{ sequelize, modelName: 'Photo', tableName: 'photos' }
	);
}
