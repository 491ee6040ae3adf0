import { onScopeDispose, shallowRef, watch, type ShallowRef } from 'vue';
import type { SectionId } from '../../src-main/contract/project.ts';
import { sectionNames } from './section-names.ts';

/** The section that is being read: the last one that reaches into the upper third of the window; null above the first. */
export function useSectionInSight(
  sheet: Readonly<ShallowRef<HTMLElement | null>>,
): Readonly<ShallowRef<SectionId | null>> {
  const ids = Object.keys(sectionNames) as SectionId[];
  const inSight = shallowRef<SectionId | null>(null);
  const reaching = new Set<Element>();
  const elementOf = (id: SectionId) => sheet.value?.querySelector(`#section-${id}`);

  const observer = new IntersectionObserver(
    (entries) => {
      for (const { target, isIntersecting } of entries) {
        if (isIntersecting) reaching.add(target);
        else reaching.delete(target);
      }
      inSight.value = ids.findLast((id) => reaching.has(elementOf(id)!)) ?? null;
    },
    { rootMargin: '0px 0px -67% 0px' },
  );
  watch(
    sheet,
    () => {
      observer.disconnect();
      reaching.clear();
      for (const id of ids) {
        const element = elementOf(id);
        if (element) observer.observe(element);
      }
    },
    { flush: 'post' },
  );
  onScopeDispose(() => observer.disconnect());
  return inSight;
}
