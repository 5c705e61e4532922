/** What `app.config.ts` may use of `today`. */
export { keepNavCounts } from './keep-nav-counts';
