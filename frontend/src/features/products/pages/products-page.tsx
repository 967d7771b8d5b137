import { Button } from 'antd';
import { useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { fireCurveNames, productKindNames } from '@mantlet/common';
import type { ProductSummaryDto } from '@mantlet/common';
import { whyNot } from '../../../lib/may.js';
import { Page } from '../../../ui/page.js';
import { Panel } from '../../../ui/panel.js';
import { Quantity } from '../../../ui/quantity.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import { EmptyState, QueryState } from '../../../ui/states.js';
import { RequireRight, useMay, useProjectIfAny } from '../../projects/project-context.js';
import { useSession } from '../../session/api/session.js';
import { useProducts } from '../api/products.js';
import type { Library } from '../api/products.js';
import { Invented, Validity } from '../components/product-marks.js';
import { RangeGlyph, spanOf } from '../components/range-glyph.js';
import type { RangeSpan } from '../components/range-glyph.js';
import { ProductDrawer } from '../forms/product-drawer.js';
import { formNames, libraryWords, rangeWords } from '../product-words.js';
import '../products.css';

/** The assessed range in words, beside a small map of it: all of the list to one scale, so that ranges compare at a glance. */
function Range({ product, span }: { product: ProductSummaryDto; span: RangeSpan }) {
  const words = rangeWords(product.range, product.kind);
  return (
    <div className="mt-range">
      <RangeGlyph range={product.range} span={span} />
      <div>
        {words.sectionFactor}, {words.temperature}
        <div className="mt-sub">{words.period}, {words.thickness}</div>
        <div className="mt-sub">{product.curves.map((c) => fireCurveNames[c]).join(', ')}{product.environments.length ? `; ${product.environments.join(', ')}` : ''}</div>
      </div>
    </div>
  );
}

function ProductTable({ library, products, at }: { library: Library; products: readonly ProductSummaryDto[]; at: string }) {
  const span = spanOf(products.map((p) => p.range));
  return (
    <Panel flush label="Products">
      <ScheduleTable
        caption="Products" rows={products} rowKey={(p) => p.id} minWidth={1100}
        columns={[
          {
            title: 'Product', key: 'name', width: 228, render: (_, p) => (
              <div><Link className="mt-strong" to={`${at}/${p.id}`}>{p.name}</Link><div className="mt-sub">{p.maker}</div>{p.invented && <Invented />}</div>
            ),
          },
          { title: 'Kind', key: 'kind', width: 122, render: (_, p) => productKindNames[p.kind] },
          { title: 'Evidence', term: 'evidence', key: 'evidence', width: 196, render: (_, p) => <div>{p.evidenceReference}, edition {p.evidenceEdition}<div className="mt-sub">{formNames[p.form]}</div></div> },
          { title: 'Valid until', key: 'valid', width: 124, render: (_, p) => <Validity product={p} /> },
          { title: 'Range', key: 'range', width: 304, render: (_, p) => <Range product={p} span={span} /> },
          { title: 'Zones', foldLabel: 'Used by zones', term: 'zone', key: 'zones', width: 66, numeric: true, render: (_, p) => <Quantity value={p.usedByZones} what="Zones that use it" /> },
          ...(library ? [{ title: 'Kept by', key: 'owner', width: 116, render: (_: unknown, p: ProductSummaryDto) => (p.projectId ? 'This project' : 'Shared library') }] : []),
        ]}
      />
    </Panel>
  );
}

function Library({ library, projectName, at, canEdit, why }: { library: Library; projectName: string | undefined; at: string; canEdit: boolean; why: string }) {
  const products = useProducts(library);
  const go = useNavigate();
  const [adding, setAdding] = useState(false);
  const words = products.data ? libraryWords(products.data, library === null) : { heading: 'Products', sub: undefined };
  const add = canEdit ? <Button {...(products.data?.length === 0 ? { type: 'primary' as const } : {})} onClick={() => setAdding(true)}>Add a product</Button> : null;
  return (
    <Page title={library ? 'Products' : 'Product library'} projectName={projectName} heading={words.heading} sub={words.sub} actions={products.data?.length ? add : null}>
      <QueryState query={products} what="the products">
        {(data) => data.length === 0
          ? <Panel label="Products"><EmptyState title="Add the first product" action={add}>{canEdit ? 'Have its assessment at hand: reference, edition, expiry, and the thickness tables, regression or thermal properties.' : why}</EmptyState></Panel>
          : <ProductTable library={library} products={data} at={at} />}
      </QueryState>
      <p className="mt-sub">
        Thickness rests on each product’s own assessment; nothing here certifies a product. {library ? 'Products of the shared library are kept by the administrator. ' : ''}{canEdit ? '' : why}
      </p>
      {adding && <ProductDrawer library={library} product={null} onClose={() => setAdding(false)} onSaved={(p) => { void go(`${at}/${p.id}`); }} />}
    </Page>
  );
}

function ProjectLibrary({ projectId, projectName }: { projectId: string; projectName: string }) {
  const canEdit = useMay()('edit-products');
  return <Library library={projectId} projectName={projectName} at={`/projects/${projectId}/products`} canEdit={canEdit} why={whyNot('edit-products')} />;
}

export default function ProductsPage() {
  const project = useProjectIfAny();
  const administrator = useSession().data?.user?.administrator ?? false;
  if (project) return <RequireRight right="see-design"><ProjectLibrary projectId={project.id} projectName={project.name} /></RequireRight>;
  return <Library library={null} projectName={undefined} at="/products" canEdit={administrator} why="The administrator keeps the shared library." />;
}
