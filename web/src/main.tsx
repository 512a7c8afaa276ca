import '@mantine/core/styles.layer.css';
import './app/theme/fonts.css';
import './app/theme/global.css';
import { reloadWhenOutdated } from './app/recover';

reloadWhenOutdated();

/** The farmer's page is its own root, so that a phone never fetches the advisor's program. */
const root = window.location.pathname === '/r' ? import('./review-root') : import('./app-root');

void root.then(({ mount }) => mount(document.getElementById('root') as HTMLElement));
