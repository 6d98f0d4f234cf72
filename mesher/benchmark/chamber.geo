// The annular chamber of the gallery, for comparison. Parameters: h size at the flame, graded 0 or 1.
If (!Exists(h)) h = 0.001; EndIf
If (!Exists(graded)) graded = 0; EndIf
Point(1) = {0, 0.32, 0}; Point(2) = {0.2, 0.32, 0}; Point(3) = {0.2, 0.34, 0}; Point(4) = {0.3, 0.34, 0};
Point(5) = {0.3, 0.28, 0}; Point(6) = {0.6, 0.28, 0}; Point(7) = {0.6, 0.395, 0}; Point(8) = {0.3, 0.395, 0};
Point(9) = {0.3, 0.37, 0}; Point(10) = {0.2, 0.37, 0}; Point(11) = {0.2, 0.4, 0}; Point(12) = {0, 0.4, 0};
Line(1) = {1, 2}; Line(2) = {2, 3}; Line(3) = {3, 4}; Line(4) = {4, 5}; Line(5) = {5, 6}; Line(6) = {6, 7};
Line(7) = {7, 8}; Line(8) = {8, 9}; Line(9) = {9, 10}; Line(10) = {10, 11}; Line(11) = {11, 12}; Line(12) = {12, 1};
Line(13) = {3, 10}; Line(14) = {4, 9};
Curve Loop(1) = {1, 2, 13, 10, 11, 12}; Plane Surface(1) = {1};
Curve Loop(2) = {3, 14, 9, -13}; Plane Surface(2) = {2};
Curve Loop(3) = {4, 5, 6, 7, 8, -14}; Plane Surface(3) = {3};
Physical Surface("plenum") = {1}; Physical Surface("burner") = {2}; Physical Surface("chamber") = {3};
Physical Curve("wall") = {1:5, 7:11}; Physical Curve("nozzle") = {6}; Physical Curve("inlet") = {12}; Physical Curve("flame") = {14};
Mesh.MeshSizeExtendFromBoundary = 0; Mesh.MeshSizeFromPoints = 0;
If (graded)
  Field[1] = Distance; Field[1].CurvesList = {14}; Field[1].NumPointsPerCurve = 200;
  Field[2] = Threshold; Field[2].InField = 1; Field[2].SizeMin = h; Field[2].SizeMax = 8*h; Field[2].DistMin = 0; Field[2].DistMax = 0.2;
  Background Field = 2;
Else
  Mesh.MeshSizeMax = h; Mesh.MeshSizeMin = h;
EndIf
