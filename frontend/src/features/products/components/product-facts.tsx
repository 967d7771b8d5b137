import { evidenceRange, fireCurveNames } from '@mantlet/common';
import type { ProductDto, ProductSupply } from '@mantlet/common';
import { formatDate, formatNumber, joinWords } from '../../../lib/format.js';
import type { TermName } from '../../../lib/terms.js';
import { Panel } from '../../../ui/panel.js';
import { Term } from '../../../ui/term.js';
import { StatusWord } from '../../../ui/status-word.js';
import { expiryWords, formNames, rangeWords } from '../product-words.js';

export function EvidenceFacts({ product }: { product: ProductDto }) {
  const expiry = expiryWords(product);
  const range = rangeWords(evidenceRange(product.evidence), product.kind);
  return (
    <Panel title={<Term name="evidence">Assessment</Term>}>
      <dl className="mt-facts">
        <dt>Reference</dt><dd>{product.evidenceReference}</dd>
        <dt>Edition</dt><dd>{product.evidenceEdition}</dd>
        <dt>Standard</dt><dd>{product.evidenceStandard}</dd>
        <dt>Valid until</dt><dd>{formatDate(product.evidenceExpiresOn)}<br /><StatusWord kind={expiry.kind}>{expiry.word}</StatusWord></dd>
        <dt>Form</dt><dd>{formNames[product.evidence.form]}</dd>
        <dt><Term name="section-factor">Section factor</Term></dt><dd>{range.sectionFactor} m⁻¹</dd>
        <dt><Term name="critical-temperature">Temperature</Term></dt><dd>{range.temperature}</dd>
        <dt><Term name="period">Period</Term></dt><dd>{range.period}</dd>
        <dt>{product.kind === 'coating' ? <Term name="dft">Thickness</Term> : 'Thickness'}</dt><dd>{range.thickness}</dd>
        <dt><Term name="fire-curve">Fire curves</Term></dt><dd>{joinWords(product.curves.map((c) => fireCurveNames[c]))}</dd>
        <dt><Term name="environment">Environments</Term></dt><dd>{product.environments.length ? product.environments.join(', ') : 'None stated'}</dd>
      </dl>
    </Panel>
  );
}

/** What buying and applying needs, for this kind of product; what is missing is said, because quantities then miss it too. */
export function supplyFacts(kind: ProductDto['kind'], s: ProductSupply, currency: string | null): [string, string | null][] {
  const money = (rate: string | null, per: string) => (rate === null ? null : `${currency ? `${currency} ` : ''}${rate} per ${per}`);
  const loss: [string, string] = ['Loss', `${formatNumber(s.lossFraction * 100, Number.isInteger(s.lossFraction * 100) ? 0 : 1)} %`];
  const labour: [string, string | null] = ['Labour', money(s.labourRate, 'm²')];
  if (kind === 'coating') {
    return [
      ['Volume solids', s.volumeSolidsPercent === null ? null : `${s.volumeSolidsPercent} %`], ['Greatest film per coat', s.maxDftPerCoatUm === null ? null : `${s.maxDftPerCoatUm} µm dry`],
      ['Density', s.densityKgPerL === null ? null : `${s.densityKgPerL} kg/L`], ['Container', s.containerL === null ? null : `${s.containerL} L`], loss, ['Material', money(s.materialRate, 'litre')], labour,
    ];
  }
  if (kind === 'board') {
    return [['Sheet', s.sheetLengthMm === null || s.sheetWidthMm === null ? null : `${s.sheetLengthMm} × ${s.sheetWidthMm} mm`], ['Material', money(s.materialRate, 'm² of sheet')], labour];
  }
  return [['Bag', s.bagKg === null ? null : `${s.bagKg} kg`], ['Yield of a bag', s.bagYieldM3 === null ? null : `${s.bagYieldM3} m³ in place`], loss, ['Material', money(s.materialRate, 'm³')], labour];
}

const termOf = (what: string): TermName | null => (what === 'Material' || what === 'Labour' ? 'rate' : what === 'Loss' ? 'waste' : what === 'Volume solids' ? 'wft' : null);

/** `withheld`: in the shared library rates are the administrator's to see; a project shows them to its design team. */
export function SupplyFacts({ product, currency, withheld }: { product: ProductDto; currency: string | null; withheld: boolean }) {
  const missing = (what: string) => (withheld && (what === 'Material' || what === 'Labour') ? 'Shown in projects, to those who design' : 'Not given');
  return (
    <Panel title="Buying and applying">
      <dl className="mt-facts">
        {supplyFacts(product.kind, product.supply, currency).map(([what, value]) => (
          <div key={what} style={{ display: 'contents' }}><dt>{termOf(what) ? <Term name={termOf(what) as TermName}>{what}</Term> : what}</dt><dd>{value ?? <span className="mt-sub">{missing(what)}</span>}</dd></div>
        ))}
      </dl>
    </Panel>
  );
}
