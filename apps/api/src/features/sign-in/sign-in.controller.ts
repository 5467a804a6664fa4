import { Body, Controller, Get, HttpCode, Post, Req, Res } from '@nestjs/common';
import { ApiNoContentResponse, ApiOkResponse, ApiTags } from '@nestjs/swagger';
import type { Request, Response } from 'express';
import { Public, SignedIn } from '../../platform/auth/access.decorators.js';
import { Caller, CallerInfo } from '../../platform/auth/caller.js';
import { Cookies } from '../../platform/auth/cookies.js';
import { Sessions, type Keys } from '../../platform/auth/sessions.js';
import { Tokens } from '../../platform/auth/tokens.js';
import { problem } from '../../platform/errors/problem.js';
import { MeView, SignedInView, SignInRequest } from './sign-in.dto.js';
import { SignInService } from './sign-in.service.js';

@ApiTags('sign-in')
@Controller()
export class SignInController {
  constructor(
    private readonly service: SignInService,
    private readonly sessions: Sessions,
    private readonly cookies: Cookies,
    private readonly tokens: Tokens,
  ) {}

  @Post('sign-in')
  @Public()
  @HttpCode(200)
  @ApiOkResponse({ type: SignedInView })
  async signIn(
    @Body() body: SignInRequest,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<SignedInView> {
    const visitor = { address: request.ip ?? '', deviceToken: this.cookies.read(request, 'device') };
    const { view, keys, deviceToken } = await this.service.signIn(body, visitor);
    await this.endFormer(request);
    this.hand(response, keys);
    this.cookies.set(response, 'device', deviceToken);
    return view;
  }

  @Post('sign-in/refresh')
  @Public()
  @HttpCode(204)
  @ApiNoContentResponse()
  async refresh(@Req() request: Request, @Res({ passthrough: true }) response: Response): Promise<void> {
    const token = this.cookies.read(request, 'refresh');
    const keys = token === null ? null : await this.sessions.rotate(token);
    if (!keys) {
      this.cookies.clear(response);
      throw problem('signed-out');
    }
    this.hand(response, keys);
  }

  @Post('sign-out')
  @Public()
  @HttpCode(204)
  @ApiNoContentResponse()
  async signOut(@Req() request: Request, @Res({ passthrough: true }) response: Response): Promise<void> {
    await this.endFormer(request);
    this.cookies.clear(response);
  }

  @Get('me')
  @SignedIn()
  @ApiOkResponse({ type: MeView })
  me(@Caller() caller: CallerInfo): Promise<MeView> {
    return this.service.me(caller);
  }

  private hand(response: Response, keys: Keys): void {
    this.cookies.set(response, 'access', keys.access);
    this.cookies.set(response, 'refresh', keys.refresh);
  }

  /** Ends the session the browser brought along, by whichever of its two cookies is still there. */
  private async endFormer(request: Request): Promise<void> {
    const refresh = this.cookies.read(request, 'refresh');
    if (refresh !== null) await this.sessions.endByRefresh(refresh, 'signed-out');
    const access = this.cookies.read(request, 'access');
    const claims = access === null ? null : this.tokens.readAccess(access);
    if (claims) await this.sessions.end(claims.sessionId, 'signed-out');
  }
}
