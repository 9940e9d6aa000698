import {
	DataTypes,
	Model,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A file attached to a note. */
export class NoteFile extends Model<InferAttributes<NoteFile>, InferCreationAttributes<NoteFile>> {
	declare id: string;
	declare noteId: string;
	declare fileId: string;
	declare ordinal: number;
	declare fileName: string;
}

export function defineNoteFile(sequelize: Sequelize): void {
	NoteFile.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			noteId: { type: DataTypes.UUID, allowNull: false },
			fileId: { type: DataTypes.UUID, allowNull: false },
			ordinal: { type: DataTypes.INTEGER, allowNull: false },
			fileName: { type: DataTypes.STRING(200), allowNull: false }
		},
		{ sequelize, modelName: 'NoteFile', tableName: 'note_files' }
	);
}
