import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** The receiver that runs this installation. One per database. */
export class Organisation extends Model<
	InferAttributes<Organisation>,
	InferCreationAttributes<Organisation>
> {
	declare id: string;
	declare name: string;
	declare countryCode: string;
	declare createdAt: Date;
}

export function defineOrganisation(sequelize: Sequelize): void {
	Organisation.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			name: { type: DataTypes.STRING(120), allowNull: false },
			countryCode: { type: DataTypes.CHAR(2), allowNull: false },
			createdAt: { type: DataTypes.DATE(3), allowNull: false }
		},
		{ sequelize, modelName: 'Organisation', tableName: 'organisations' }
	);
}
