export { cast, castPassword, type CastName } from '../../db/seed/cast';
