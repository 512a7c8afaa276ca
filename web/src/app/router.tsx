import type { RouteObject } from 'react-router-dom';
import { RouteError } from './routes/route-error';
import { NotFound } from './routes/not-found';
import { AppLayout, type PageHandle } from './shell/app-layout';
import { RouteLoading } from './shell/route-loading';

/** Every page of the advisor's program; pages arrive as their own files when first opened. */
export function makeRoutes(): RouteObject[] {
  return [
    {
      errorElement: <RouteError />,
      HydrateFallback: RouteLoading,
      children: [
        {
          path: '/sign-in',
          lazy: async () => ({
            Component: (await import('../features/account/sign-in-page')).SignInPage,
          }),
        },
        {
          path: '/styleguide',
          lazy: async () => ({ Component: (await import('./routes/styleguide')).Styleguide }),
        },
        {
          element: <AppLayout />,
          children: [{ errorElement: <RouteError />, children: pages }],
        },
      ],
    },
  ];
}

/** Marks a page that anyone may read, signed in or not. */
const OPEN: PageHandle = { open: true };

const pages: RouteObject[] = [
  {
    index: true,
    lazy: async () => ({ Component: (await import('../features/desk/desk-page')).DeskPage }),
  },
  {
    path: 'farms',
    lazy: async () => ({ Component: (await import('../features/farms/farms-page')).FarmsPage }),
  },
  {
    path: 'fields',
    lazy: async () => ({
      Component: (await import('../features/field-map/fields-page')).FieldsPage,
    }),
  },
  {
    path: 'fields/:fieldId',
    lazy: async () => ({ Component: (await import('./routes/field-route')).FieldRoute }),
  },
  {
    path: 'fields/:fieldId/scenarios/new',
    lazy: async () => ({
      Component: (await import('../features/row-designer/designer-page')).DesignerPage,
    }),
  },
  {
    path: 'fields/:fieldId/scenarios/:scenarioId',
    lazy: async () => ({
      Component: (await import('../features/row-designer/designer-page')).DesignerPage,
    }),
  },
  {
    path: 'fields/:fieldId/scenarios/:scenarioId/result',
    lazy: async () => ({ Component: (await import('../features/results/result-page')).ResultPage }),
  },
  {
    path: 'fields/:fieldId/compare',
    lazy: async () => ({
      Component: (await import('../features/compare/compare-page')).ComparePage,
    }),
  },
  {
    path: 'cooperative',
    lazy: async () => ({
      Component: (await import('../features/cooperative/cooperative-page')).CooperativePage,
    }),
  },
  {
    path: 'weather',
    lazy: async () => ({
      Component: (await import('../features/weather/weather-page')).WeatherPage,
    }),
  },
  {
    path: 'how-we-know',
    handle: OPEN,
    lazy: async () => ({ Component: (await import('./routes/how-we-know')).HowWeKnow }),
  },
  {
    path: 'help',
    handle: OPEN,
    lazy: async () => ({ Component: (await import('./routes/help')).Help }),
  },
  { path: '*', element: <NotFound /> },
];
