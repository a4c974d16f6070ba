@echo off
rem Starts Hullsum from wherever this script is called.
setlocal
for %%I in ("%~dp0..") do set "HULLSUM=%%~fI"
set "JAVA=java"
if defined JAVA_HOME set "JAVA=%JAVA_HOME%\bin\java"
"%JAVA%" -Xlog:disable -Xlog:all=error:stderr -Xshare:auto -XX:SharedArchiveFile="%HULLSUM%\hullsum.jsa" -XX:+UseSerialGC -XX:NewRatio=8 -XX:-UsePerfData -XX:Tier4InvocationThreshold=50000 -XX:Tier4MinInvocationThreshold=6000 -XX:Tier4CompileThreshold=150000 -XX:Tier4BackEdgeThreshold=400000 -jar "%HULLSUM%\hullsum.jar" %*
exit /b %ERRORLEVEL%
