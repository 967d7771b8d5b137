import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { ProductDto, ProductInput, ProductSummaryDto, ProductUpdate, ReadTableDto } from '@mantlet/common';
import { api, apiUrl } from '../../../lib/api-client.js';
import { projectKey } from '../../../lib/query-client.js';

/** null stands for the shared library */
export type Library = string | null;
const at = (library: Library) => (library ? `/projects/${library}/products` : '/products');
const keyOf = (library: Library, ...rest: readonly unknown[]) => (library ? projectKey(library, 'products', ...rest) : (['shared-products', ...rest] as const));

export const productsQuery = (library: Library) =>
  queryOptions({ queryKey: keyOf(library, 'list'), queryFn: ({ signal }) => api.get<ProductSummaryDto[]>(at(library), undefined, signal) });
export const useProducts = (library: Library) => useQuery(productsQuery(library));

export const productQuery = (library: Library, productId: string) =>
  queryOptions({ queryKey: keyOf(library, 'one', productId), queryFn: ({ signal }) => api.get<ProductDto>(`${at(library)}/${productId}`, undefined, signal) });
export const useProduct = (library: Library, productId: string, enabled = true) => useQuery({ ...productQuery(library, productId), enabled });

export const evidenceFileUrl = (library: Library, productId: string) => apiUrl(`${at(library)}/${productId}/evidence-file`);

/** A product touches results in every project that uses it, so everything that was fetched is asked for again. */
function useProductMutation<Body, Result>(send: (body: Body) => Promise<Result>) {
  const client = useQueryClient();
  return useMutation({ mutationFn: send, onSuccess: () => client.invalidateQueries() });
}
export const useCreateProduct = (library: Library) => useProductMutation((body: ProductInput) => api.post<ProductDto>(at(library), body));
export const useUpdateProduct = (library: Library, productId: string) => useProductMutation((body: ProductUpdate) => api.put<ProductDto>(`${at(library)}/${productId}`, body));
export const useStoreEvidenceFile = (library: Library, productId: string) =>
  useProductMutation((file: File) => api.upload<ProductDto>(`${at(library)}/${productId}/evidence-file`, file, {}, 'PUT'));

/** The page is left before the product is forgotten: what was deleted is no longer there to be asked for. */
export function useDeleteProduct(library: Library, productId: string) {
  const client = useQueryClient();
  const remove = useMutation({
    mutationFn: () => api.delete(`${at(library)}/${productId}`),
    onSuccess: () => {
      client.setQueryData(productsQuery(library).queryKey, (list) => list?.filter((p) => p.id !== productId));
      return client.invalidateQueries({ predicate: (query) => !query.queryKey.includes(productId) });
    },
  });
  return { ...remove, forget: () => client.removeQueries({ queryKey: keyOf(library, 'one', productId) }) };
}

/** Reads one thickness table from a sheet; nothing is stored. */
export const useReadTable = (library: Library) =>
  useMutation({ mutationFn: ({ file, fields }: { file: File; fields: Record<string, string> }) => api.upload<ReadTableDto>(`${at(library)}/read-table`, file, fields) });
