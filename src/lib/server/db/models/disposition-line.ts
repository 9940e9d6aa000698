import {
	conditionKinds,
	whereaboutsKinds,
	type ConditionKind,
	type Whereabouts
} from '../../../domain/receiving/line-groups';
import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** The outcome of one line, or of one group of it, in a signed decision. */
export class DispositionLine extends Model<
	InferAttributes<DispositionLine>,
	InferCreationAttributes<DispositionLine>
> {
	declare id: string;
	declare dispositionId: string;
	declare lineId: string;
	declare ordinal: CreationOptional<number>;
	declare name: CreationOptional<string>;
	declare outcome: 'accept' | 'conditions' | 'hold' | 'reject';
	declare cases: number;
	declare pallets: number;
	declare conditionText: string | null;
	declare reason: string | null;
	declare conditionKind: ConditionKind | null;
	declare whereabouts: Whereabouts | null;
	declare place: string | null;
	declare awaited: string | null;
	declare untilAt: Date | null;
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
			ordinal: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
			name: { type: DataTypes.STRING(80), allowNull: false, defaultValue: '' },
			conditionKind: { type: DataTypes.ENUM(...conditionKinds), allowNull: true },
			whereabouts: { type: DataTypes.ENUM(...whereaboutsKinds), allowNull: true },
			place: { type: DataTypes.STRING(80), allowNull: true },
			awaited: { type: DataTypes.STRING(400), allowNull: true },
			untilAt: { type: DataTypes.DATE(3), allowNull: true },
			assessmentId: { type: DataTypes.UUID, allowNull: true }
		},
		{ sequelize, modelName: 'DispositionLine', tableName: 'disposition_lines' }
	);
}
