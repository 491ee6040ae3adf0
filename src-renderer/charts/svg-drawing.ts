import { h, type FunctionalComponent, type VNode } from 'vue';
import type { SvgNode } from '../../src-main/figures/svg-node.ts';

/** Renders a drawing that is plain data; texts stay texts. */
export const SvgDrawing: FunctionalComponent<{ drawing: SvgNode }> = ({ drawing }) => vnode(drawing);
SvgDrawing.props = ['drawing'];

function vnode(node: SvgNode): VNode {
  return h(node.tag, node.attributes, 'text' in node ? node.text : node.children.map(vnode));
}
