import { h, type FunctionalComponent, type VNode } from 'vue';
import type { SvgNode } from '../../src-main/figures/svg-node.ts';
import { tspans } from '../../src-main/figures/tspans.ts';

/** Renders a drawing that is plain data; texts stay texts. */
export const SvgDrawing: FunctionalComponent<{ drawing: SvgNode }> = ({ drawing }) => vnode(drawing);
SvgDrawing.props = ['drawing'];

function vnode(node: SvgNode): VNode {
  if (!('text' in node)) return h(node.tag, node.attributes, node.children.map(vnode));
  if (node.tag !== 'text') return h(node.tag, node.attributes, node.text);
  return h(
    node.tag,
    node.attributes,
    tspans(node.text).map((span) => (typeof span === 'string' ? span : vnode(span))),
  );
}
