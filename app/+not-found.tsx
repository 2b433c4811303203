export { NotFoundScreen as default } from '../shared/screens/shell/not-found-screen';
