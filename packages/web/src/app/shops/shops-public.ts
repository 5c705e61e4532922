/** What other slices may use of `shops`. */
export { SettingsFrame } from './settings-frame/settings-frame';
