export { SettingsScreen as default } from '../shared/screens/settings/settings-screen';
