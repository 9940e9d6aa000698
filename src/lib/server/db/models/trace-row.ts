import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** All readings of one channel, packed. */
export class TraceRow extends Model<InferAttributes<TraceRow>, InferCreationAttributes<TraceRow>> {
	declare id: string;
	declare readId: string;
	declare shipmentId: string;
	declare ordinal: number;
	declare name: string;
	declare quantity: string;
	declare unit: string;
	declare decimals: number;
	declare readings: number;
	declare firstAt: Date;
	declare lastAt: Date;
	declare usualIntervalMs: number;
	declare minCelsius: number | null;
	declare maxCelsius: number | null;
	declare meanCelsius: number | null;
	declare packed: Buffer;
	declare contentSha256: string;
	declare tripId: string | null;
	declare isAssessed: boolean;
	declare clockShiftMs: CreationOptional<number>;
}

export function defineTraceRow(sequelize: Sequelize): void {
	TraceRow.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			readId: { type: DataTypes.UUID, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			ordinal: { type: DataTypes.INTEGER, allowNull: false },
			name: { type: DataTypes.STRING(120), allowNull: false },
			quantity: { type: DataTypes.STRING(20), allowNull: false },
			unit: { type: DataTypes.STRING(20), allowNull: false },
			decimals: { type: DataTypes.INTEGER, allowNull: false },
			readings: { type: DataTypes.INTEGER, allowNull: false },
			firstAt: { type: DataTypes.DATE(3), allowNull: false },
			lastAt: { type: DataTypes.DATE(3), allowNull: false },
			usualIntervalMs: { type: DataTypes.BIGINT, allowNull: false },
			minCelsius: { type: DataTypes.DOUBLE, allowNull: true },
			maxCelsius: { type: DataTypes.DOUBLE, allowNull: true },
			meanCelsius: { type: DataTypes.DOUBLE, allowNull: true },
			packed: { type: DataTypes.BLOB('long'), allowNull: false },
			contentSha256: { type: DataTypes.CHAR(64), allowNull: false, field: 'content_sha256' },
			tripId: { type: DataTypes.UUID, allowNull: true },
			isAssessed: { type: DataTypes.BOOLEAN, allowNull: false },
			clockShiftMs: { type: DataTypes.BIGINT, allowNull: false, defaultValue: 0 }
		},
		{ sequelize, modelName: 'TraceRow', tableName: 'traces' }
	);
}
