import { apiUrl } from './api';

type PageSize = 'thumb' | 'display' | 'original';

/** The address of a page's picture; the rev of the page in it, so that a turned page is asked for again. */
export const pagePictureUrl = (pageImageId: string, size: PageSize, rev?: number): string => apiUrl(`/page-images/${pageImageId}/file?size=${size}${rev === undefined ? '' : `&v=${rev}`}`);

/** The address of a cut-out; its version in it, so that it never shows another picture. */
export const cropUrl = (answerId: string, crop: { readonly box: string; readonly version: string }): string => apiUrl(`/answers/${answerId}/crop?box=${crop.box}&v=${crop.version}`);
