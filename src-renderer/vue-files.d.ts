/** For tools that read TypeScript without reading Vue files: what such a file gives. */
declare module '*.vue' {
  import type { Component } from 'vue';

  const component: Component;
  export = component;
}
