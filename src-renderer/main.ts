import { createApp } from 'vue';
import App from './App.vue';
import { createSession, sessionKey } from './state/use-session.ts';
import { useTheme } from './state/use-theme.ts';
import './style/index.css';

useTheme();
createApp(App).provide(sessionKey, createSession()).mount('#app');
