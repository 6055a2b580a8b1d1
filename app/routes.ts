import { index, type RouteConfig, route } from "@react-router/dev/routes";

export default [
  index("routes/home.tsx"),
  route("safety", "routes/safety.tsx"),
  route("sign-in", "routes/auth/sign-in.tsx"),
  route("sign-out", "routes/auth/sign-out.tsx"),
  route("invitation/:token", "routes/auth/invitation.tsx"),
  route("office", "routes/office/office-layout.tsx", [
    index("routes/office/index.tsx"),
    route("yards", "routes/office/yards/list.tsx"),
    route("yards/new", "routes/office/yards/new.tsx"),
    route("yards/:yardId", "routes/office/yards/yard.tsx"),
    route("trucks", "routes/office/trucks/list.tsx"),
    route("trucks/new", "routes/office/trucks/new.tsx"),
    route("trucks/:unit", "routes/office/trucks/truck.tsx"),
    route("trucks/:unit/details", "routes/office/trucks/details.tsx"),
    route("trucks/:unit/move", "routes/office/trucks/move.tsx"),
    route("trucks/:unit/fittings/new", "routes/office/trucks/add-fitting.tsx"),
    route("trucks/:unit/fittings/:fittingId", "routes/office/trucks/fitting.tsx"),
    route("trucks/:unit/set-points/:reading", "routes/office/trucks/set-point.tsx"),
    route("trucks/:unit/tests/:test", "routes/office/trucks/dated-test.tsx"),
    route("trucks/:unit/sheet", "routes/office/trucks/sheet.tsx"),
    route("checks", "routes/office/checks/checks.tsx"),
  ]),
] satisfies RouteConfig;
