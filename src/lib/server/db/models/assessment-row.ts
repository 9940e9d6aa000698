import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** What one trace says about one line. Recomputed freely until signed. */
export class AssessmentRow extends Model<
	InferAttributes<AssessmentRow>,
	InferCreationAttributes<AssessmentRow>
> {
	declare id: string;
	declare shipmentId: string;
	declare lineId: string;
	declare traceId: string;
	declare specVersionId: string;
	declare engineVersion: string;
	declare inputsSha256: string;
	declare figures: string;
	declare remainingHours: number;
	declare remainingLowHours: number;
	declare remainingHighHours: number;
	declare neededHours: number;
	declare isGoverning: boolean;
	declare isCurrent: boolean;
	declare madeAt: Date;
}

export function defineAssessmentRow(sequelize: Sequelize): void {
	AssessmentRow.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			lineId: { type: DataTypes.UUID, allowNull: false },
			traceId: { type: DataTypes.UUID, allowNull: false },
			specVersionId: { type: DataTypes.UUID, allowNull: false },
			engineVersion: { type: DataTypes.STRING(20), allowNull: false },
			inputsSha256: { type: DataTypes.CHAR(64), allowNull: false, field: 'inputs_sha256' },
			figures: { type: DataTypes.TEXT('long'), allowNull: false },
			remainingHours: { type: DataTypes.DOUBLE, allowNull: false },
			remainingLowHours: { type: DataTypes.DOUBLE, allowNull: false },
			remainingHighHours: { type: DataTypes.DOUBLE, allowNull: false },
			neededHours: { type: DataTypes.DOUBLE, allowNull: false },
			isGoverning: { type: DataTypes.BOOLEAN, allowNull: false },
			isCurrent: { type: DataTypes.BOOLEAN, allowNull: false },
			madeAt: { type: DataTypes.DATE(3), allowNull: false }
		},
		{ sequelize, modelName: 'AssessmentRow', tableName: 'assessments' }
	);
}
