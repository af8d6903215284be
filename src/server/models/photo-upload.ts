import { sequelize } from '#server/db/sequelize.ts';
import { Arriving, arrivingColumns } from './_arriving.ts';

/** A photo that arrives in pieces, until it is shown. */
export class PhotoUpload extends Arriving {}

PhotoUpload.init(arrivingColumns(), { sequelize, tableName: 'photo_uploads' });
