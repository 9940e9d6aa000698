import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** The recommendation for one line, with its reasons. */
export class LineRecommendation extends Model<
	InferAttributes<LineRecommendation>,
	InferCreationAttributes<LineRecommendation>
> {
	declare id: string;
	declare shipmentId: string;
	declare lineId: string;
	declare recommended: 'accept' | 'hold' | 'reject';
	declare reasons: string;
	declare madeAt: Date;
}

export function defineLineRecommendation(sequelize: Sequelize): void {
	LineRecommendation.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			lineId: { type: DataTypes.UUID, allowNull: false },
			recommended: { type: DataTypes.ENUM('accept', 'hold', 'reject'), allowNull: false },
			reasons: { type: DataTypes.TEXT('long'), allowNull: false },
			madeAt: { type: DataTypes.DATE(3), allowNull: false }
		},
		{ sequelize, modelName: 'LineRecommendation', tableName: 'line_recommendations' }
	);
}
