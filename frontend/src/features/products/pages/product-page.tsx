import { App, Button } from 'antd';
import { useState } from 'react';
import { Link, useNavigate, useParams } from 'react-router-dom';
import { productKindNames } from '@mantlet/common';
import type { ProductDto } from '@mantlet/common';
import { ApiError } from '../../../lib/api-client.js';
import { whyNot } from '../../../lib/may.js';
import { DeleteButton } from '../../../ui/form/delete-button.js';
import { Page } from '../../../ui/page.js';
import { Panel } from '../../../ui/panel.js';
import { QueryState } from '../../../ui/states.js';
import { RequireRight, useMay, useProjectIfAny } from '../../projects/project-context.js';
import { useSession } from '../../session/api/session.js';
import { useDeleteProduct, useProduct } from '../api/products.js';
import type { Library } from '../api/products.js';
import { EvidenceFile } from '../components/evidence-file.js';
import { EvidenceView } from '../components/evidence-view.js';
import { Invented } from '../components/product-marks.js';
import { EvidenceFacts, SupplyFacts } from '../components/product-facts.js';
import { ProductDrawer } from '../forms/product-drawer.js';
import { expiryWords, productHeading } from '../product-words.js';
import '../products.css';

function Actions({ product, library, at, onEdit }: { product: ProductDto; library: Library; at: string; onEdit: () => void }) {
  const { modal } = App.useApp();
  const go = useNavigate();
  const remove = useDeleteProduct(library, product.id);
  const onDelete = () => remove.mutate(undefined, {
    onSuccess: () => { void Promise.resolve(go(at)).then(remove.forget); },
    onError: (error) => { modal.error({ title: 'Not deleted', content: error instanceof ApiError ? error.message : 'Something went wrong in this page; try again.', icon: null }); },
  });
  return (
    <>
      <Button onClick={onEdit}>Edit</Button>
      <DeleteButton what={product.name} consequence="Its assessed data and its evidence file go with it. A product that a zone uses is kept." onDelete={onDelete} busy={remove.isPending} />
    </>
  );
}

/** Who keeps the product, where the reader cannot edit it. */
function keeper(product: ProductDto, inProject: boolean): string {
  if (inProject && product.projectId !== null) return whyNot('edit-products');
  return 'The administrator keeps the shared library; a project’s specifier can add a product of its own.';
}

interface ProductProps { library: Library; productId: string; at: string; projectName: string | undefined; currency: string | null; editsOwn: boolean }

function Product({ library, productId, at, projectName, currency, editsOwn }: ProductProps) {
  const query = useProduct(library, productId);
  const [editing, setEditing] = useState(false);
  const product = query.data;
  const canEdit = product ? editsOwn && product.projectId === library : false;
  const expiry = product ? expiryWords(product) : null;
  return (
    <Page
      title={product?.name ?? 'Product'} trail={[product?.name ?? 'Product', library === null ? 'Product library' : 'Products']} projectName={projectName} heading={product ? productHeading(product.evidence) : 'Product'}
      sub={product && <>{product.name} by {product.maker}. {productKindNames[product.kind]}; {product.evidenceReference}, edition {product.evidenceEdition}. {product.invented && <Invented />}</>}
      state={expiry ? { word: expiry.word, kind: expiry.kind } : undefined}
      actions={product && canEdit ? <Actions product={product} library={library} at={at} onEdit={() => setEditing(true)} /> : null}
    >
      <QueryState query={query} what="the product">
        {(p) => (
          <div className="mt-columns">
            <div className="mt-stack">
              <EvidenceView evidence={p.evidence} kind={p.kind} />
              {p.note && <Panel title="Note"><p style={{ whiteSpace: 'pre-line' }}>{p.note}</p></Panel>}
            </div>
            <div className="mt-stack">
              <EvidenceFacts product={p} />
              <EvidenceFile product={p} library={library} canEdit={canEdit} />
              <SupplyFacts product={p} currency={currency} withheld={library === null && !canEdit} />
            </div>
          </div>
        )}
      </QueryState>
      <p className="mt-sub"><Link to={at}>All products</Link>. {product && !canEdit ? keeper(product, library !== null) : ''}</p>
      {editing && product && <ProductDrawer library={library} product={product} onClose={() => setEditing(false)} onSaved={() => setEditing(false)} />}
    </Page>
  );
}

function ProjectProduct({ productId, projectId, projectName, currency }: { productId: string; projectId: string; projectName: string; currency: string }) {
  const editsOwn = useMay()('edit-products');
  return <Product library={projectId} productId={productId} at={`/projects/${projectId}/products`} projectName={projectName} currency={currency} editsOwn={editsOwn} />;
}

export default function ProductPage() {
  const { productId = '' } = useParams();
  const project = useProjectIfAny();
  const administrator = useSession().data?.user?.administrator ?? false;
  if (project) return <RequireRight right="see-design"><ProjectProduct key={productId} productId={productId} projectId={project.id} projectName={project.name} currency={project.currency} /></RequireRight>;
  return <Product key={productId} library={null} productId={productId} at="/products" projectName={undefined} currency={null} editsOwn={administrator} />;
}
