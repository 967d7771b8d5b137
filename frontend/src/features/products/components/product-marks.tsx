import type { ProductSummaryDto } from '@mantlet/common';
import { formatDate } from '../../../lib/format.js';
import { StatusWord } from '../../../ui/status-word.js';
import { expiryWords } from '../product-words.js';

export const Invented = () => <span className="mt-invented">Invented for demonstration</span>;

export function Validity({ product }: { product: Pick<ProductSummaryDto, 'evidenceExpiresOn' | 'expired'> }) {
  const { word, kind } = expiryWords(product);
  return <span>{formatDate(product.evidenceExpiresOn)}<br /><StatusWord kind={kind}>{word}</StatusWord></span>;
}
