import type { Request, Router } from 'express';
import { getMe, signIn, signOut, signOutEverywhere } from '../../shared/contracts/session';
import { getWaiting } from '../../shared/contracts/waiting';
import { requireActor } from '../auth/access';
import type { AppPassport } from '../auth/passport';
import type { Context } from '../context';
import { AppError } from '../errors';
import { asyncRoute, openRoute, route } from '../http/route';
import { signInLimit } from '../http/sign-in-limit';
import { endAllSessions, recordSessionAct, whoAmI } from '../services/session';
import { waitingFor } from '../services/waiting';

const signInByPassword = (passport: AppPassport, req: Request): Promise<Express.User | false> =>
  new Promise((resolve, reject) => {
    passport.authenticate('local', (error: unknown, user: Express.User | false) => (error ? reject(error as Error) : resolve(user)))(
      req,
      req.res,
      reject,
    );
  });

const startSession = (req: Request, user: Express.User): Promise<void> =>
  new Promise((resolve, reject) => req.logIn(user, (error: unknown) => (error ? reject(error as Error) : resolve())));

const endSession = (req: Request): Promise<void> =>
  new Promise((resolve, reject) => req.session.destroy((error: unknown) => (error ? reject(error as Error) : resolve())));

export function sessionRoutes(router: Router, context: Context, passport: AppPassport): void {
  const limit = signInLimit(context);

  openRoute(
    router,
    context,
    signIn,
    async ({ req, res }) => {
      const user = await signInByPassword(passport, req);
      if (!user) {
        recordSessionAct(context, null, 'sign-in-refused');
        const left = limit.triesLeft(req);
        throw new AppError('not_signed_in', `That name and password do not go together. ${left === 1 ? 'One try is' : `${left} tries are`} left.`);
      }
      await startSession(req, user);
      recordSessionAct(context, user.personId, 'signed-in');
      limit.forget(req);
      res.set('Cache-Control', 'no-store');
      return whoAmI(context, requireActor(context, user.personId));
    },
    limit.middleware,
  );

  asyncRoute(router, context, signOut, async ({ actor, req, res }) => {
    recordSessionAct(context, actor.personId, 'signed-out');
    await endSession(req);
    res.clearCookie('meniscus').set('Clear-Site-Data', '"cache"');
  });

  route(router, context, signOutEverywhere, ({ actor, res }) => {
    endAllSessions(context, actor);
    res.clearCookie('meniscus').set('Clear-Site-Data', '"cache"');
  });

  route(router, context, getMe, ({ actor }) => whoAmI(context, actor));
  route(router, context, getWaiting, ({ actor }) => ({ lines: waitingFor(context, actor) }));
}
