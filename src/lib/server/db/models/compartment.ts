import {
	DataTypes,
	Model,
	type CreationOptional,
	type InferAttributes,
	type InferCreationAttributes,
	type Sequelize
} from 'sequelize';

/** A chamber of a trailer with its own set-point. */
export class Compartment extends Model<InferAttributes<Compartment>, InferCreationAttributes<Compartment>> {
	declare id: string;
	/** Null: named on papers, and no truck is known. */
	declare visitId: string | null;
	/** The docket whose papers name it. */
	declare shipmentId: CreationOptional<string | null>;
	declare name: string;
	declare setPointCelsius: number | null;
	declare supplyAirCelsius: number | null;
	declare returnAirCelsius: number | null;
}

export function defineCompartment(sequelize: Sequelize): void {
	Compartment.init(
		{
			id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
			visitId: { type: DataTypes.UUID, allowNull: true },
			shipmentId: { type: DataTypes.UUID, allowNull: true },
			name: { type: DataTypes.STRING(40), allowNull: false },
			setPointCelsius: { type: DataTypes.DOUBLE, allowNull: true },
			supplyAirCelsius: { type: DataTypes.DOUBLE, allowNull: true },
			returnAirCelsius: { type: DataTypes.DOUBLE, allowNull: true }
		},
		{ sequelize, modelName: 'Compartment', tableName: 'compartments' }
	);
}
