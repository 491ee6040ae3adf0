// Imports that the bundler and the test runner answer with a file's content, such as `*.woff2?inline`.
/// <reference types="vite/client" />
