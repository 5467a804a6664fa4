/** Seconds an access token is good for. */
export const ACCESS_S = 15 * 60;
/** Seconds a session may lie unused before it ends. */
export const REFRESH_IDLE_S = 30 * 86_400;
/** Seconds after which a session ends however much it is used. */
export const SESSION_S = 90 * 86_400;
