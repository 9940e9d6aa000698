import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** The outcome of one line in a signed decision. */
export class DispositionLine extends Model<
	InferAttributes<DispositionLine>,
	InferCreationAttributes<DispositionLine>
> {
	declare id: string;
	declare dispositionId: string;
	declare lineId: string;
	declare outcome: 'accept' | 'conditions' | 'hold' | 'reject';
	declare cases: number;
	declare pallets: number;
	declare conditionText: string | null;
	declare reason: string | null;
	declare assessmentId: string | null;
}

export function defineDispositionLine(sequelize: Sequelize): void {
	DispositionLine.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			dispositionId: { type: DataTypes.UUID, allowNull: false },
			lineId: { type: DataTypes.UUID, allowNull: false },
			outcome: { type: DataTypes.ENUM('accept', 'conditions', 'hold', 'reject'), allowNull: false },
			cases: { type: DataTypes.INTEGER, allowNull: false },
			pallets: { type: DataTypes.INTEGER, allowNull: false },
			conditionText: { type: DataTypes.STRING(400), allowNull: true },
			reason: { type: DataTypes.STRING(400), allowNull: true },
			assessmentId: { type: DataTypes.UUID, allowNull: true }
		},
		{ sequelize, modelName: 'DispositionLine', tableName: 'disposition_lines' }
	);
}
