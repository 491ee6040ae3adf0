import { onMounted, onScopeDispose, ref, type Ref, type ShallowRef } from 'vue';

/** The width of an element in CSS pixels, so that drawings keep their type size at every width. */
export function useWidth(element: Readonly<ShallowRef<HTMLElement | null>>, initial: number): Readonly<Ref<number>> {
  const width = ref(initial);
  const observer = new ResizeObserver(([entry]) => {
    if (entry && entry.contentRect.width > 0) width.value = Math.round(entry.contentRect.width);
  });
  onMounted(() => element.value && observer.observe(element.value));
  onScopeDispose(() => observer.disconnect());
  return width;
}
