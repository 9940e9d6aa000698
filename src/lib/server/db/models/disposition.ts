import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A signed decision. Versions; amended, never edited. */
export class Disposition extends Model<InferAttributes<Disposition>, InferCreationAttributes<Disposition>> {
	declare id: string;
	declare shipmentId: string;
	declare version: number;
	declare verdict: 'accepted' | 'conditions' | 'part' | 'rejected';
	declare reasons: CreationOptional<string>;
	declare amendmentReason: string | null;
	declare meaning: 'approval' | 'review' | 'authorship';
	declare signedBy: string;
	declare signedName: string;
	declare signedTitle: string;
	declare signedAt: Date;
	declare zone: string;
	declare frozen: string;
	declare frozenSha256: string;
}

export function defineDisposition(sequelize: Sequelize): void {
	Disposition.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			version: { type: DataTypes.INTEGER, allowNull: false },
			verdict: { type: DataTypes.ENUM('accepted', 'conditions', 'part', 'rejected'), allowNull: false },
			reasons: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
			amendmentReason: { type: DataTypes.TEXT, allowNull: true },
			meaning: { type: DataTypes.ENUM('approval', 'review', 'authorship'), allowNull: false },
			signedBy: { type: DataTypes.UUID, allowNull: false },
			signedName: { type: DataTypes.STRING(120), allowNull: false },
			signedTitle: { type: DataTypes.STRING(120), allowNull: false },
			signedAt: { type: DataTypes.DATE(3), allowNull: false },
			zone: { type: DataTypes.STRING(64), allowNull: false },
			frozen: { type: DataTypes.TEXT('long'), allowNull: false },
			frozenSha256: { type: DataTypes.CHAR(64), allowNull: false, field: 'frozen_sha256' }
		},
		{ sequelize, modelName: 'Disposition', tableName: 'dispositions' }
	);
}
