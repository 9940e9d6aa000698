import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A logger's clock put right by a person, for every channel of its read. */
export class ClockCorrection extends Model<
	InferAttributes<ClockCorrection>,
	InferCreationAttributes<ClockCorrection>
> {
	declare id: string;
	declare readId: string;
	/** Added to every reading's instant. */
	declare shiftMs: number;
	declare reason: string;
	declare madeBy: string;
	declare madeAt: Date;
	declare undoneBy: string | null;
	declare undoneAt: Date | null;
	/** What was recommended before and after, as JSON, where the correction changed it. */
	declare movedRecommendation: CreationOptional<string | null>;
}

export function defineClockCorrection(sequelize: Sequelize): void {
	ClockCorrection.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			readId: { type: DataTypes.UUID, allowNull: false },
			shiftMs: { type: DataTypes.BIGINT, allowNull: false },
			reason: { type: DataTypes.STRING(300), allowNull: false },
			madeBy: { type: DataTypes.UUID, allowNull: false },
			madeAt: { type: DataTypes.DATE(3), allowNull: false },
			undoneBy: { type: DataTypes.UUID, allowNull: true },
			undoneAt: { type: DataTypes.DATE(3), allowNull: true },
			movedRecommendation: { type: DataTypes.TEXT, allowNull: true }
		},
		{ sequelize, modelName: 'ClockCorrection', tableName: 'clock_corrections' }
	);
}
