/**
 * The name of an uploaded file as it may be shown and stored: no folders, no control characters, at most 150 characters; `otherwise`
 * where nothing is left. Browsers send names in UTF-8, which the multipart reader takes for Latin-1.
 */
export function uploadedName({ originalname }: Pick<Express.Multer.File, 'originalname'>, otherwise: string): string {
  const utf8 = Buffer.from(originalname, 'latin1').toString('utf8');
  const name = (utf8.includes('\uFFFD') ? originalname : utf8).replace(/^.*[\\/]/s, '').replace(/[\p{Cc}\p{Surrogate}]/gu, '').trim();
  return name.slice(-150) || otherwise;
}
