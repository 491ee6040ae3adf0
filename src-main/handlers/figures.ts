import { exportFigure } from '../report/figure-export.ts';
import type { Handlers } from './context.ts';

export const figureHandlers: Handlers<'figure.export'> = {
  async 'figure.export'({ figure, format }) {
    const { fileName, mediaType, bytes } = await exportFigure(figure, format);
    return { fileName, mediaType, bytes: bytes.toString('base64') };
  },
};
