import { routes } from '@/lib/routes';

export type PlantBookSearch = { text?: string; area?: string; state?: string; layout?: string };

export type PlantBookView = {
  text: string;
  area: string;
  state: 'active' | 'retired';
  layout: 'table' | 'tree';
};

/** What the address asks for. */
export function viewOf(search: PlantBookSearch): PlantBookView {
  return {
    text: search.text ?? '',
    area: search.area ?? '',
    state: search.state === 'retired' ? 'retired' : 'active',
    layout: search.layout === 'tree' ? 'tree' : 'table',
  };
}

/** The address of a view; what is usual is left out. */
export function plantBookAddress(view: PlantBookView): string {
  const query = new URLSearchParams();
  if (view.text) query.set('text', view.text);
  if (view.area) query.set('area', view.area);
  if (view.state === 'retired') query.set('state', 'retired');
  if (view.layout === 'tree') query.set('layout', 'tree');
  const text = query.toString();
  return routes.plantBook(text ? `?${text}` : '');
}
