import { sequelize } from '#server/db/sequelize.ts';
import { Arriving, arrivingColumns } from './_arriving.ts';

/** A video that is still arriving. */
export class VideoUpload extends Arriving {}

VideoUpload.init(arrivingColumns(), { sequelize, tableName: 'video_uploads' });
