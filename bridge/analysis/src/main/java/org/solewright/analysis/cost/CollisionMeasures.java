package org.solewright.analysis.cost;
record CollisionMeasures(double collisionAngle, double collisionFraction, double mechanicalCostOfTransport) {
 static CollisionMeasures of(double[] f, double[] v, double step, double mass, double g){
  int n=f.length/3; double sw=0,sp=0,sl=0,st=0,ap=0,dist=0;
  for(int i=0;i<n;i++){ double w=(i==0||i==n-1?0.5:1)*step; double fx=f[3*i],fy=f[3*i+1],fz=f[3*i+2],vx=v[3*i],vy=v[3*i+1],vz=v[3*i+2];
   double F=Math.sqrt(fx*fx+fy*fy+fz*fz),V=Math.sqrt(vx*vx+vy*vy+vz*vz),h=Math.hypot(vx,vy),d=fx*vx+fy*vy+fz*vz; double k=F*V*w;
   sw+=k; sp+=k*Math.abs(Math.asin(d/(F*V))); sl+=k*Math.acos(Math.min(1,Math.abs(fz)/F)); st+=k*Math.acos(Math.min(1,h/V)); ap+=w*Math.abs(d); dist+=w*h; }
  return new CollisionMeasures(sp/sw, sp/(sl+st), ap/(mass*g*dist)); } }
