import { inject, provide, type InjectionKey, type Ref } from 'vue';

/** What a remark in the margin can do; the margin gives it, the remark asks for it. */
export interface RemarkActs {
  may: Readonly<Ref<{ answer: boolean; close: boolean }>>;
  ask(cellId: string, text: string): Promise<void>;
  answer(id: string, text: string): Promise<void>;
  close(id: string): Promise<void>;
  reopen(id: string): Promise<void>;
}

export const remarkActsKey: InjectionKey<RemarkActs> = Symbol('remark acts');

export function provideRemarkActs(acts: RemarkActs): void {
  provide(remarkActsKey, acts);
}

export function useRemarkActs(): RemarkActs {
  const acts = inject(remarkActsKey);
  if (acts === undefined) throw new Error('a remark stands only in the margin of a sheet');
  return acts;
}
