/** What search engines are told of a series and of who teaches it, in the words of schema.org, as JSON-LD. */
import { isCurrency } from '#core/money/currency.ts';
import { priceFieldText } from '#core/money/format-price.ts';
import { titleHalves } from '#core/series/title.ts';
import type { SeriesFor } from '#server/queries/series/series-for.ts';
import type { TeacherPage } from '#server/queries/shop/teacher-page.ts';
import { publicAddress } from '#server/web/public-address.ts';

export type Thing = Readonly<Record<string, unknown>>;

const CONTEXT = 'https://schema.org';
/** In the words of the dictionary of levels that schema.org's examples use. */
const LEVELS = { beginner: 'Beginner', 'some-practice': 'Intermediate', 'sure-hand': 'Advanced' } as const satisfies Record<SeriesFor['level'], string>;

/** `PT10H30M` (ISO 8601). */
const duration = (minutes: number): string => `PT${Math.floor(minutes / 60)}H${minutes % 60}M`;

/** @param facts `hours` of likely work, null while nothing is planned: then the length of the parts stands for it; `picture` an absolute address */
export function courseOf(series: SeriesFor, facts: { readonly hours: number | null; readonly picture: string | null }): Thing {
  const { hours, picture } = facts;
  const { slug, title, summary, level, techniques, parts, workroom } = series;
  const minutes = hours === null ? parts.reduce((sum, part) => sum + part.minutes, 0) : Math.round(hours * 60);
  const teacher = { '@type': 'Person', name: workroom.teacherName, url: publicAddress(`/teachers/${workroom.handle}`) };
  const { name } = titleHalves(title);
  return {
    '@context': CONTEXT,
    '@type': 'Course',
    name,
    description: summary === '' ? title : summary,
    url: publicAddress(`/series/${slug}`),
    inLanguage: 'en',
    ...(picture !== null && { image: picture }),
    educationalLevel: LEVELS[level],
    ...(techniques.length > 0 && { teaches: techniques }),
    provider: { '@type': 'Organization', name: workroom.name, url: publicAddress(`/teachers/${workroom.handle}`) },
    hasCourseInstance: { '@type': 'CourseInstance', courseMode: 'online', courseWorkload: duration(minutes), instructor: teacher },
    hasPart: parts.filter(({ isPreview }) => isPreview).map((part) => ({ '@type': 'LearningResource', name: part.title, url: publicAddress(`/series/${slug}/${part.number}`), isAccessibleForFree: true })),
    ...offersOf(series),
  };
}

/** A series without a price is not offered. */
function offersOf({ slug, priceMinor, currency }: SeriesFor): Thing {
  if (priceMinor === null || !isCurrency(currency)) return {};
  const offer = { '@type': 'Offer', category: priceMinor === 0 ? 'Free' : 'Paid', price: priceFieldText({ amountMinor: priceMinor, currency }), priceCurrency: currency, availability: 'https://schema.org/InStock', url: publicAddress(`/series/${slug}`) };
  return { isAccessibleForFree: priceMinor === 0, offers: [offer] };
}

export function personOf({ handle, teacherName, workroomName, about }: TeacherPage): Thing {
  return {
    '@context': CONTEXT,
    '@type': 'Person',
    name: teacherName,
    url: publicAddress(`/teachers/${handle}`),
    ...(about !== '' && { description: about }),
    worksFor: { '@type': 'Organization', name: workroomName },
  };
}

export function crumbsOf(way: readonly { readonly path: string; readonly name: string }[]): Thing {
  return { '@context': CONTEXT, '@type': 'BreadcrumbList', itemListElement: way.map(({ path, name }, index) => ({ '@type': 'ListItem', position: index + 1, name, item: publicAddress(path) })) };
}
