import { lazy, Suspense } from 'react';
import { createBrowserRouter, Navigate, type RouteObject } from 'react-router-dom';
import { HomePage } from '../features/darkrooms/pages/home-page.js';
import { SinkPage } from '../features/sink/pages/sink-page.js';
import { NotFoundPage } from '../shared/ui/not-found-page.js';
import { Waiting } from '../shared/ui/waiting.js';
import { BottleLink } from './bottle-link.js';
import { BrokenPage } from './broken-page.js';
import { DarkroomFrame } from './frame/darkroom-frame.js';
import { SignInGate } from './sign-in-gate.js';

// The sink comes at once; the rest is fetched when it is opened.
const SignInPage = lazy(async () => ({
  default: (await import('../features/sign-in/pages/sign-in-page.js')).SignInPage,
}));
const BottlePage = lazy(async () => ({
  default: (await import('../features/bottles/pages/bottle-page.js')).BottlePage,
}));
const MorePage = lazy(async () => ({
  default: (await import('../features/darkrooms/pages/more-page.js')).MorePage,
}));
const MixingPage = lazy(async () => ({
  default: (await import('../features/mixing/pages/mixing-page.js')).MixingPage,
}));
const NewMixPage = lazy(async () => ({
  default: (await import('../features/mixing/pages/new-mix-page.js')).NewMixPage,
}));
const ShelfPage = lazy(async () => ({
  default: (await import('../features/shelf/pages/shelf-page.js')).ShelfPage,
}));
const ReceivePage = lazy(async () => ({
  default: (await import('../features/shelf/pages/receive-page.js')).ReceivePage,
}));
const NeedsYouPage = lazy(async () => ({
  default: (await import('../features/alerts/pages/needs-you-page.js')).NeedsYouPage,
}));
const OrdersPage = lazy(async () => ({
  default: (await import('../features/orders/pages/orders-page.js')).OrdersPage,
}));
const OrderPage = lazy(async () => ({
  default: (await import('../features/orders/pages/order-page.js')).OrderPage,
}));
const LogPage = lazy(async () => ({ default: (await import('../features/log/pages/log-page.js')).LogPage }));

export const routes: RouteObject[] = [
  {
    path: '/sign-in',
    element: (
      <Suspense fallback={<Waiting what="the page" />}>
        <SignInPage />
      </Suspense>
    ),
  },
  {
    element: <SignInGate />,
    errorElement: <BrokenPage />,
    children: [
      { path: '/', element: <HomePage /> },
      { path: '/b/:darkroomId/:code', element: <BottleLink /> },
      {
        path: '/d/:darkroom',
        element: <DarkroomFrame />,
        children: [
          { index: true, element: <Navigate to="sink" replace /> },
          { path: 'sink', element: <SinkPage /> },
          { path: 'bottles/:code', element: <BottlePage /> },
          { path: 'mixing', element: <MixingPage /> },
          { path: 'mixing/new', element: <NewMixPage /> },
          { path: 'shelf', element: <ShelfPage /> },
          { path: 'shelf/receive', element: <ReceivePage /> },
          { path: 'needs-you', element: <NeedsYouPage /> },
          { path: 'orders', element: <OrdersPage /> },
          { path: 'orders/:id', element: <OrderPage /> },
          { path: 'log', element: <LogPage /> },
          { path: 'more', element: <MorePage /> },
          { path: '*', element: <NotFoundPage missing="page" /> },
        ],
      },
      { path: '*', element: <NotFoundPage missing="page" /> },
    ],
  },
];

export const createRouter = () => createBrowserRouter(routes);
