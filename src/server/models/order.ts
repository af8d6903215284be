import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import { count, id, json, maybeJson, maybeMoment, maybeRef, maybeText, moment, oneOf, publicId, ref, text } from '#server/db/columns.ts';
import { sequelize } from '#server/db/sequelize.ts';
import type { MyPiece } from '#core/craft/fit.ts';
import type { OrderState } from '#core/checkout/settle.ts';
import type { KeptCheckout, OrderTerms } from '#contracts/checkout.ts';

/** A wish to buy a seat, with the exact words sent to the payment service, so that the same wish can be sent again. */
export class Order extends Model<InferAttributes<Order>, InferCreationAttributes<Order>> {
  declare id: CreationOptional<number>;
  declare publicId: CreationOptional<string>;
  declare userId: number;
  declare seriesId: number;
  declare state: CreationOptional<OrderState>;
  declare amountMinor: number;
  declare currency: string;
  declare attempt: CreationOptional<number>;
  declare checkoutParameters: KeptCheckout;
  declare sessionId: CreationOptional<string | null>;
  declare payUrl: CreationOptional<string | null>;
  declare paymentIntentId: CreationOptional<string | null>;
  declare terms: OrderTerms;
  /** The piece on the loom she tried before she bought; becomes her own with the seat. */
  declare loom: CreationOptional<MyPiece | null>;
  declare receiptNumber: CreationOptional<number | null>;
  declare expiresAt: Date;
  declare paidAt: CreationOptional<Date | null>;
  declare reviewReason: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Order.init({
  id: id(),
  publicId: publicId(),
  userId: ref(),
  seriesId: ref(),
  state: oneOf(['pending', 'paid', 'expired', 'refused', 'review'], 'pending'),
  amountMinor: { type: DataTypes.BIGINT, allowNull: false },
  currency: text(3),
  attempt: count(1),
  checkoutParameters: json(),
  sessionId: maybeText(255),
  payUrl: { type: DataTypes.TEXT, allowNull: true, defaultValue: null },
  paymentIntentId: maybeText(255),
  terms: json(),
  loom: maybeJson(),
  receiptNumber: maybeRef(),
  expiresAt: moment(),
  paidAt: maybeMoment(),
  reviewReason: maybeText(200),
  createdAt: moment(),
  updatedAt: moment(),
}, { sequelize, tableName: 'orders' });
