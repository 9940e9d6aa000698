import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

export const moveKinds = ['handover', 'papers', 'pulp', 'read'] as const;

/** A correction that moved what is recommended on a docket, and who made it. */
export class RecommendationMove extends Model<
	InferAttributes<RecommendationMove>,
	InferCreationAttributes<RecommendationMove>
> {
	declare id: string;
	declare shipmentId: string;
	declare kind: (typeof moveKinds)[number];
	declare madeBy: string;
	declare madeAt: Date;
	/** What was recommended before and after, as JSON text. */
	declare moved: string;
}

export function defineRecommendationMove(sequelize: Sequelize): void {
	RecommendationMove.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			kind: { type: DataTypes.ENUM(...moveKinds), allowNull: false },
			madeBy: { type: DataTypes.UUID, allowNull: false },
			madeAt: { type: DataTypes.DATE(3), allowNull: false },
			moved: { type: DataTypes.TEXT, allowNull: false }
		},
		{ sequelize, modelName: 'RecommendationMove', tableName: 'recommendation_moves' }
	);
}
