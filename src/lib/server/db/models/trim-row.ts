import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A stretch that was not the journey, left out by a person. */
export class TrimRow extends Model<InferAttributes<TrimRow>, InferCreationAttributes<TrimRow>> {
	declare id: string;
	declare traceId: string;
	declare fromAt: Date;
	declare toAt: Date;
	declare reason: string;
	declare madeBy: string;
	declare madeAt: Date;
	declare undoneBy: string | null;
	declare undoneAt: Date | null;
	/** What was recommended before and after, as JSON, where the trim changed it. */
	declare movedRecommendation: CreationOptional<string | null>;
}

export function defineTrimRow(sequelize: Sequelize): void {
	TrimRow.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			traceId: { type: DataTypes.UUID, allowNull: false },
			fromAt: { type: DataTypes.DATE(3), allowNull: false },
			toAt: { type: DataTypes.DATE(3), allowNull: false },
			reason: { type: DataTypes.STRING(300), allowNull: false },
			madeBy: { type: DataTypes.UUID, allowNull: false },
			madeAt: { type: DataTypes.DATE(3), allowNull: false },
			undoneBy: { type: DataTypes.UUID, allowNull: true },
			undoneAt: { type: DataTypes.DATE(3), allowNull: true },
			movedRecommendation: { type: DataTypes.TEXT, allowNull: true }
		},
		{ sequelize, modelName: 'TrimRow', tableName: 'trims' }
	);
}
