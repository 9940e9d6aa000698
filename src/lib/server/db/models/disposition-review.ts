import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A signed review of a decision that another person approves. */
export class DispositionReview extends Model<
	InferAttributes<DispositionReview>,
	InferCreationAttributes<DispositionReview>
> {
	declare id: string;
	declare shipmentId: string;
	declare evidenceSha256: string;
	declare decisionSha256: string;
	/** The outcomes as they were reviewed, as hashed text. */
	declare decision: string;
	declare reasons: string;
	declare signedBy: string;
	declare signedName: string;
	declare signedTitle: string;
	declare signedAt: Date;
	declare zone: string;
}

export function defineDispositionReview(sequelize: Sequelize): void {
	DispositionReview.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			evidenceSha256: { type: DataTypes.CHAR(64), allowNull: false, field: 'evidence_sha256' },
			decisionSha256: { type: DataTypes.CHAR(64), allowNull: false, field: 'decision_sha256' },
			decision: { type: DataTypes.TEXT, allowNull: false },
			reasons: { type: DataTypes.TEXT, allowNull: false },
			signedBy: { type: DataTypes.UUID, allowNull: false },
			signedName: { type: DataTypes.STRING(120), allowNull: false },
			signedTitle: { type: DataTypes.STRING(120), allowNull: false },
			signedAt: { type: DataTypes.DATE(3), allowNull: false },
			zone: { type: DataTypes.STRING(64), allowNull: false }
		},
		{ sequelize, modelName: 'DispositionReview', tableName: 'disposition_reviews' }
	);
}
