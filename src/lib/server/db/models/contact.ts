import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A person at a partner. */
export class Contact extends Model<InferAttributes<Contact>, InferCreationAttributes<Contact>> {
	declare id: string;
	declare partnerId: string;
	declare name: string;
	declare email: string;
	declare phone: string;
	declare duty: string;
	declare isNotified: boolean;
	declare switchedOffAt: Date | null;
}

export function defineContact(sequelize: Sequelize): void {
	Contact.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			partnerId: { type: DataTypes.UUID, allowNull: false },
			name: { type: DataTypes.STRING(120), allowNull: false },
			email: { type: DataTypes.STRING(254), allowNull: false },
			phone: { type: DataTypes.STRING(40), allowNull: false },
			duty: { type: DataTypes.STRING(80), allowNull: false },
			isNotified: { type: DataTypes.BOOLEAN, allowNull: false },
			switchedOffAt: { type: DataTypes.DATE(3), allowNull: true }
		},
		{ sequelize, modelName: 'Contact', tableName: 'contacts' }
	);
}
