import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A numbered version of a product's shelf-life model and limits. A signed version never changes. */
export class SpecVersion extends Model<InferAttributes<SpecVersion>, InferCreationAttributes<SpecVersion>> {
	declare id: string;
	declare productId: string;
	declare varietyId: string | null;
	declare number: number;
	declare state: 'draft' | 'signed';
	declare figures: string;
	declare figuresSha256: string;
	declare reason: CreationOptional<string>;
	declare createdBy: string | null;
	declare createdAt: Date;
	declare signedBy: string | null;
	declare signedAt: Date | null;
	declare inForceFrom: Date | null;
	declare supersededAt: Date | null;
}

export function defineSpecVersion(sequelize: Sequelize): void {
	SpecVersion.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			productId: { type: DataTypes.UUID, allowNull: false },
			varietyId: { type: DataTypes.UUID, allowNull: true },
			number: { type: DataTypes.INTEGER, allowNull: false },
			state: { type: DataTypes.ENUM('draft', 'signed'), allowNull: false },
			figures: { type: DataTypes.TEXT('long'), allowNull: false },
			figuresSha256: { type: DataTypes.CHAR(64), allowNull: false, field: 'figures_sha256' },
			reason: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
			createdBy: { type: DataTypes.UUID, allowNull: true },
			createdAt: { type: DataTypes.DATE(3), allowNull: false },
			signedBy: { type: DataTypes.UUID, allowNull: true },
			signedAt: { type: DataTypes.DATE(3), allowNull: true },
			inForceFrom: { type: DataTypes.DATE(3), allowNull: true },
			supersededAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'SpecVersion', tableName: 'spec_versions' }
	);
}
