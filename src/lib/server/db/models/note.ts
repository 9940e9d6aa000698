import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A note on a docket. */
export class Note extends Model<InferAttributes<Note>, InferCreationAttributes<Note>> {
	declare id: string;
	declare shipmentId: string;
	declare text: CreationOptional<string>;
	declare writtenBy: string;
	declare writtenAt: Date;
}

export function defineNote(sequelize: Sequelize): void {
	Note.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			shipmentId: { type: DataTypes.UUID, allowNull: false },
			text: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
			writtenBy: { type: DataTypes.UUID, allowNull: false },
			writtenAt: { type: DataTypes.DATE(3), allowNull: false }
		},
		{ sequelize, modelName: 'Note', tableName: 'notes' }
	);
}
