export { SignInScreen as default } from '../shared/screens/sign-in/sign-in-screen';
