"use strict";
(function () {
  const stage = document.getElementById("stage");
  const holder = document.getElementById("scene");
  if (!stage || !window.THREE) { return; }
  const T = window.THREE;
  const data = JSON.parse(document.getElementById("scene-data").textContent);
  holder.hidden = false;
  let renderer;
  try {
    renderer = new T.WebGLRenderer({ antialias: true, preserveDrawingBuffer: true });
  } catch (e) {
    holder.hidden = true;
    return;
  }
  document.documentElement.classList.add("moving");
  renderer.setPixelRatio(Math.min(2, window.devicePixelRatio || 1));
  renderer.setClearColor(0xf1f5f5);
  stage.appendChild(renderer.domElement);
  const scene = new T.Scene();
  const camera = new T.PerspectiveCamera(32, 16 / 9, 0.05, 20);
  scene.add(new T.HemisphereLight(0xffffff, 0x9aa4a8, 2.4));
  const sun = new T.DirectionalLight(0xffffff, 1.6);
  sun.position.set(-1, 3, 2);
  scene.add(sun);
  const grid = new T.GridHelper(1.6, 32, 0x8b979c, 0xd0d8da);
  scene.add(grid);
  const colours = [0x8b979c, 0x0b5d66, 0xa03a12, 0x6a3b83, 0x5b6200];
  const parts = {};
  data.parts.forEach(function (part, k) {
    const group = new T.Group();
    group.matrixAutoUpdate = false;
    const n = part.around, rings = part.points.length / 3 / n, faces = [];
    for (let i = 0; i + 1 < rings; i++) {
      for (let j = 0; j < n; j++) {
        const a = i * n + j, b = i * n + (j + 1) % n, c = a + n, d = b + n;
        faces.push(a, b, c, b, d, c);
      }
    }
    for (let j = 1; j + 1 < n; j++) {
      faces.push(0, j + 1, j, (rings - 1) * n, (rings - 1) * n + j, (rings - 1) * n + j + 1);
    }
    const geometry = new T.BufferGeometry();
    geometry.setAttribute("position", new T.Float32BufferAttribute(part.points, 3));
    geometry.setIndex(faces);
    geometry.computeVertexNormals();
    const shank = part.name === "shank";
    group.add(new T.Mesh(geometry, new T.MeshLambertMaterial({
      color: colours[k % colours.length], side: T.DoubleSide, transparent: true, opacity: shank ? 0.3 : 0.45, depthWrite: false })));
    const lines = [];
    for (let i = 0; i < rings; i++) {
      for (let j = 0; j < n; j++) { lines.push(i * n + j, i * n + (j + 1) % n); }
    }
    const wire = new T.BufferGeometry();
    wire.setAttribute("position", new T.Float32BufferAttribute(part.points, 3));
    wire.setIndex(lines);
    group.add(new T.LineSegments(wire, new T.LineBasicMaterial({ color: colours[k % colours.length] })));
    parts[part.name] = group;
    scene.add(group);
  });
  function line(points, colour) {
    const g = new T.BufferGeometry();
    g.setAttribute("position", new T.Float32BufferAttribute(points, 3));
    return new T.Line(g, new T.LineBasicMaterial({ color: colour }));
  }
  data.joints.forEach(function (joint) {
    const group = parts[joint.part];
    if (!group) { return; }
    const ball = new T.Mesh(new T.SphereGeometry(0.007, 20, 14), new T.MeshLambertMaterial({ color: 0x1b2428 }));
    ball.position.fromArray(joint.at);
    group.add(ball);
    joint.axes.forEach(function (axis) {
      const a = joint.at, k = 0.07;
      group.add(line([a[0] - k * axis[0], a[1] - k * axis[1], a[2] - k * axis[2],
        a[0] + k * axis[0], a[1] + k * axis[1], a[2] + k * axis[2]], 0x1b2428));
    });
  });
  data.pads.forEach(function (pad) {
    const group = parts[pad.part];
    if (!group) { return; }
    const mesh = new T.Mesh(new T.SphereGeometry(pad.r, 14, 10),
      new T.MeshBasicMaterial({ color: 0x5b6200, wireframe: true, transparent: true, opacity: 0.45 }));
    mesh.position.fromArray(pad.at);
    group.add(mesh);
  });
  if (data.arc.length && parts.shank) { parts.shank.add(line(data.arc, 0xa03a12)); }
  const path = [];
  data.instants.forEach(function (i) { if (i.cop.length) { path.push(i.cop[0], 0.001, i.cop[2]); } });
  if (path.length > 3) { scene.add(line(path, 0x1b2428)); }
  const pressure = new T.Mesh(new T.SphereGeometry(0.006, 16, 12), new T.MeshBasicMaterial({ color: 0x9c1030 }));
  const force = new T.ArrowHelper(new T.Vector3(0, 1, 0), new T.Vector3(), 0.2, 0x9c1030, 0.03, 0.016);
  scene.add(pressure, force);

  const slider = document.getElementById("instant");
  const state = document.getElementById("scene-state");
  const play = document.getElementById("play");
  const still = window.matchMedia("(prefers-reduced-motion: reduce)").matches;
  const most = data.instants.reduce(function (m, i) { return Math.max(m, i.load); }, 1);
  let current = 0, timer = 0, centre = new T.Vector3(0.05, 0.09, 0);
  const start = { turn: -0.55, lift: 0.32, away: 1.05 };
  let turn = start.turn, lift = start.lift, away = start.away;

  function show(k) {
    current = Math.max(0, Math.min(data.instants.length - 1, k));
    const instant = data.instants[current];
    Object.keys(parts).forEach(function (name) {
      const p = instant.pose[name];
      parts[name].visible = Boolean(p);
      if (p) {
        parts[name].matrix.set(p[0], p[3], p[6], p[9], p[1], p[4], p[7], p[10], p[2], p[5], p[8], p[11], 0, 0, 0, 1);
      }
    });
    const loaded = instant.cop.length > 0;
    pressure.visible = force.visible = loaded;
    if (loaded) {
      pressure.position.set(instant.cop[0], 0.002, instant.cop[2]);
      force.position.copy(pressure.position);
      force.setLength(Math.max(0.04, 0.3 * instant.load / most), 0.03, 0.016);
    }
    slider.value = String(current);
    const words = Math.round(instant.t) + " % of stance" + (loaded ? ", load " + instant.load + " N" : "");
    slider.setAttribute("aria-valuetext", words);
    state.textContent = words;
    draw();
  }
  function draw() {
    lift = Math.max(-0.2, Math.min(1.5607, lift));
    away = Math.max(0.3, Math.min(4, away));
    camera.position.set(centre.x + away * Math.cos(lift) * Math.sin(turn), centre.y + away * Math.sin(lift),
      centre.z + away * Math.cos(lift) * Math.cos(turn));
    camera.lookAt(centre);
    renderer.render(scene, camera);
  }
  function size() {
    const w = stage.clientWidth, h = stage.clientHeight;
    if (w > 0 && h > 0) {
      renderer.setSize(w, h, false);
      camera.aspect = w / h;
      camera.updateProjectionMatrix();
      draw();
    }
  }
  function stop() {
    window.clearInterval(timer);
    timer = 0;
    play.textContent = "Play";
    play.setAttribute("aria-pressed", "false");
  }
  function toggle() {
    if (timer) { stop(); return; }
    play.textContent = "Pause";
    play.setAttribute("aria-pressed", "true");
    timer = window.setInterval(function () { show((current + 1) % data.instants.length); }, still ? 400 : 40);
  }
  function view(t, l) { turn = t; lift = l; draw(); }
  function reset() { stop(); turn = start.turn; lift = start.lift; away = start.away; show(0); }
  play.addEventListener("click", toggle);
  slider.addEventListener("input", function () { stop(); show(Number(slider.value)); });
  document.getElementById("view-side").addEventListener("click", function () { view(0, 0.02); });
  document.getElementById("view-top").addEventListener("click", function () { view(0, 1.5607); });
  document.getElementById("view-front").addEventListener("click", function () { view(Math.PI / 2, 0.05); });
  document.getElementById("view-reset").addEventListener("click", reset);
  const keys = {
    ArrowLeft: function () { turn -= 0.1; draw(); }, ArrowRight: function () { turn += 0.1; draw(); },
    ArrowUp: function () { lift += 0.08; draw(); }, ArrowDown: function () { lift -= 0.08; draw(); },
    "+": function () { away /= 1.12; draw(); }, "=": function () { away /= 1.12; draw(); },
    "-": function () { away *= 1.12; draw(); }, " ": toggle,
    ",": function () { stop(); show(current - 1); }, ".": function () { stop(); show(current + 1); },
    s: function () { view(0, 0.02); }, t: function () { view(0, 1.5607); }, f: function () { view(Math.PI / 2, 0.05); },
    r: reset
  };
  stage.addEventListener("keydown", function (e) {
    const act = keys[e.key.length === 1 ? e.key.toLowerCase() : e.key];
    if (act && !e.ctrlKey && !e.metaKey && !e.altKey) { act(); e.preventDefault(); }
  });
  let held = null;
  stage.addEventListener("pointerdown", function (e) { held = [e.clientX, e.clientY]; stage.setPointerCapture(e.pointerId); });
  stage.addEventListener("pointermove", function (e) {
    if (!held) { return; }
    turn -= (e.clientX - held[0]) * 0.008;
    lift += (e.clientY - held[1]) * 0.008;
    held = [e.clientX, e.clientY];
    draw();
  });
  stage.addEventListener("pointerup", function () { held = null; });
  stage.addEventListener("wheel", function (e) {
    if (document.activeElement === stage) { away *= e.deltaY > 0 ? 1.08 : 1 / 1.08; draw(); e.preventDefault(); }
  }, { passive: false });
  window.addEventListener("resize", size);
  if (data.instants.length < 2) { play.disabled = true; slider.disabled = true; }
  size();
  show(Math.floor(data.instants.length * 0.3));
}());
