// Collections whose entries live in the database.
import { defineLiveCollection } from 'astro:content';
import { lessonLoader } from '#server/web/lesson-loader.ts';

export const collections = {
  lessons: defineLiveCollection({ loader: lessonLoader() }),
};
