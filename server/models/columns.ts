import { DataTypes } from 'sequelize';

/* Fresh objects each time: Sequelize writes into the column definitions it is given. */
export const text = () => ({ type: DataTypes.TEXT, allowNull: false }) as const;
export const optionalText = () => ({ type: DataTypes.TEXT, allowNull: true }) as const;
export const whole = () => ({ type: DataTypes.INTEGER, allowNull: false }) as const;
export const optionalWhole = () => ({ type: DataTypes.INTEGER, allowNull: true }) as const;
export const rowId = () => ({ type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true }) as const;
export const version = () => ({ type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 }) as const;
